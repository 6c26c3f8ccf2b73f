import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import { colour } from '../colouring/colour.ts';
import { colouringProblem, strangersIn } from './colouring-problem.ts';

const noBorders = {
	a: new Uint32Array(),
	b: new Uint32Array(),
	kind: new Uint8Array(),
	metres: new Float64Array(),
	at: new Float64Array(),
};
const ground = { keys: ['a', 'b', 'c', 'd'], borders: noBorders };

describe('colouringProblem', () => {
	it('writes a group out: a chain to keep alike, every pair to differ', () => {
		const problem = colouringProblem(
			ground,
			blankDraft({
				groups: [
					{ kind: 'alike', name: 'North', keys: ['c', 'a', 'c', 'd'] },
					{ kind: 'different', name: 'South', keys: ['a', 'b', 'd'] },
				],
			}),
		);
		expect(problem.alike).toEqual([
			[2, 0],
			[0, 3],
		]);
		expect(problem.apart).toEqual([
			[0, 1],
			[0, 3],
			[1, 3],
		]);
	});

	it('leaves regions out that are not there, and names them when asked', () => {
		const draft = blankDraft({
			locks: { x: { ink: 0, cost: 1 } },
			forbidden: [{ key: 'y', ink: 1 }],
			alike: [['a', 'y']],
			groups: [{ kind: 'alike', name: 'North', keys: ['a', 'z', 'b'] }],
		});
		const problem = colouringProblem(ground, draft);
		expect(problem).toMatchObject({ forbidden: [], alike: [[0, 1]] });
		expect([...problem.locks!]).toEqual([-1, -1, -1, -1]);
		expect(strangersIn(ground.keys, draft)).toEqual(['x', 'y', 'z']);
	});

	it('asks for a colouring in which a group of different regions has as many inks', async () => {
		const keys = ['a', 'b', 'c'];
		const draft = blankDraft({ groups: [{ kind: 'different', name: 'All', keys }] });
		const result = await colour(colouringProblem(ground, draft));
		expect(result).toMatchObject({ status: 'coloured', inksUsed: 3 });
	});

	it('writes groups of 100,000 regions out pair by pair, nothing more', () => {
		const written = (regions: number) => {
			const keys = Array.from({ length: regions }, (_, r) => `region ${r}`);
			const groups = Array.from({ length: regions / 10 }, (_, g) => ({
				kind: g % 2 ? ('alike' as const) : ('different' as const),
				name: `group ${g}`,
				keys: keys.slice(10 * g, 10 * g + 10),
			}));
			const problem = colouringProblem({ keys, borders: noBorders }, blankDraft({ groups }));
			return [problem.alike!.length, problem.apart!.length];
		};
		expect(written(100_000)).toEqual([5_000 * 9, 5_000 * 45]);
	});
});
