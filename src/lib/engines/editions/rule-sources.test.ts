import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { blankDraft } from '../../../../tests/support/blank-draft.ts';
import type { ColouringProblem, Rule } from '../colouring/problem.ts';
import { colouringProblem } from './colouring-problem.ts';
import type { Draft } from './draft.ts';
import { lockSource, ruleSources } from './rule-sources.ts';

const keys = ['a', 'b', 'c', 'd', 'e'];
const names = ['Ost', '', 'Süd', 'West', 'Mitte'];
const borders = {
	a: Uint32Array.of(0, 0, 1, 2, 3),
	b: Uint32Array.of(1, 2, 2, 3, 4),
	kind: Uint8Array.of(0, 1, 2, 4, 0),
	metres: Float64Array.of(5, 0, 700, 900, 50),
	at: new Float64Array(10),
};
const ground = { keys, names, borders };

const key = fc.constantFrom(...keys);
const pair = fc.tuple(key, key).filter(([a, b]) => a !== b);
const named = pair.map(([a, b]) => ({ a, b, reason: 'so' }));
const drafts = fc.record({
	alike: fc.array(pair, { maxLength: 3 }),
	apart: fc.array(pair, { maxLength: 3 }),
	forbidden: fc.array(
		fc
			.record({ key, ink: fc.nat(2) })
			.chain((one) => fc.constantFrom(one, { ...one, tie: 4 }, { ...one, tie: 5 })),
		{ maxLength: 4 },
	),
	groups: fc.uniqueArray(
		fc.record({
			kind: fc.constantFrom('alike' as const, 'different' as const),
			name: fc.constantFrom('North', 'South'),
			keys: fc.uniqueArray(key, { minLength: 2 }),
		}),
		{ maxLength: 4, selector: ({ kind, name }) => `${kind} ${name}` },
	),
	reserved: fc.uniqueArray(fc.nat(3), { maxLength: 2 }),
	struck: fc.array(named, { maxLength: 2 }),
	added: fc.array(named, { maxLength: 2 }),
	pointTouches: fc.boolean(),
	waterKm: fc.constantFrom(null, 0, 1),
	leastMetres: fc.constantFrom(0, 10),
});

/** Every rule that the problem of a draft holds. */
function rulesOf({ borders: list, alike, apart, forbidden, reserved }: ColouringProblem): Rule[] {
	const pairs = (kind: 'alike' | 'apart', of: ColouringProblem['alike']) =>
		(of ?? []).map(([a, b]): Rule => ({ kind, a, b }));
	return [
		...Array.from(list.a, (a, i): Rule => ({ kind: 'border', a, b: list.b[i] })),
		...pairs('alike', alike),
		...pairs('apart', apart),
		...(forbidden ?? []).map(([region, ink]): Rule => ({ kind: 'forbidden', region, ink })),
		...(reserved ?? []).map((ink): Rule => ({ kind: 'reserved', region: 0, ink })),
	];
}

const unordered = (rule: Rule) =>
	JSON.stringify('a' in rule ? [rule.kind, [rule.a, rule.b].sort()] : rule);

describe('ruleSources', () => {
	it('finds what stands behind every rule, and no rule stands once all of it is dropped', () => {
		fc.assert(
			fc.property(drafts, (changes) => {
				const draft = blankDraft(changes);
				for (const rule of rulesOf(colouringProblem(ground, draft))) {
					const sources = ruleSources(draft, ground, rule);
					expect(sources.length).toBeGreaterThan(0);
					const without = sources.reduce((left, { drop }) => drop(left), draft);
					const left = rulesOf(colouringProblem(ground, without)).map(unordered);
					expect(left).not.toContain(unordered(rule));
					for (const { drop } of sources) expect(drop(without)).toBe(without);
				}
			}),
			{ numRuns: 120 },
		);
	});

	it('says in words what would be dropped', () => {
		const draft = blankDraft({
			locks: { a: { ink: 0, cost: 2 }, b: { ink: 7, cost: 1, tie: 4 } },
			forbidden: [{ key: 'c', ink: 1, tie: 9 }],
			groups: [{ kind: 'different', name: 'North', keys: ['a', 'c', 'd'] }],
			reserved: [1],
			ties: [{ sheet: 4, name: 'Next door', edition: null, revision: 3 }],
		});
		const said = (rule: Rule) => ruleSources(draft, ground, rule).map(({ words }) => words);
		expect(said({ kind: 'border', a: 1, b: 0 })).toEqual(['b and Ost share a border']);
		expect(said({ kind: 'apart', a: 0, b: 3 })).toEqual([
			'all 3 regions of “North” are kept different from each other',
		]);
		expect(said({ kind: 'forbidden', region: 2, ink: 1 })).toEqual([
			'Süd may not be Two, as the adjoining sheet no. 9 asks',
		]);
		expect(said({ kind: 'reserved', region: 2, ink: 1 })).toEqual([
			'Two is reserved for regions locked to it',
		]);
		expect(lockSource(draft, ground, 0)).toMatchObject({
			kind: 'lock',
			words: 'Ost is locked to One',
		});
		expect(lockSource(draft, ground, 1)).toMatchObject({
			kind: 'tie',
			words: 'b is locked to ink 8, as the adjoining sheet “Next door” asks',
		});
		expect(lockSource(draft, ground, 2)).toBeNull();
		const dropped = lockSource(draft, ground, 0)?.drop(draft) as Draft;
		expect(Object.keys(dropped.locks)).toEqual(['b']);
	});

	it('has nothing to drop for the number of inks', () => {
		expect(ruleSources(blankDraft(), ground, { kind: 'inks', inks: 4 })).toEqual([]);
	});
});
