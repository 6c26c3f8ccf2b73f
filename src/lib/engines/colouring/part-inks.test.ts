import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { randomTriangulation } from '../../../../tests/support/planar.ts';
import { checkParting, colour, partInks, type ColouringProblem } from './index.ts';

const pairs = (list: [number, number][]) => ({
	a: Uint32Array.from(list, ([a]) => a),
	b: Uint32Array.from(list, ([, b]) => b),
});
const locks = (...inks: number[]) => Int32Array.from(inks);
/** hub 0 and a ring of four round it */
const wheel = pairs([
	[0, 1],
	[0, 2],
	[0, 3],
	[0, 4],
	[1, 2],
	[2, 3],
	[3, 4],
	[1, 4],
]);

describe('keeping unsafe inks apart', () => {
	it('finds another colouring, with no more inks than there are', () => {
		const problem: ColouringProblem = { regions: 5, borders: wheel, inks: 'fewest' };
		const from = Int32Array.of(0, 1, 2, 1, 2);
		const answer = partInks({ problem, unsafe: [[1, 2]], inks: 4, from });
		expect(answer).toMatchObject({ status: 'parted', inksUsed: 4 });
		if (answer.status !== 'parted') return;
		expect(checkParting({ problem, unsafe: [[1, 2]], inks: 4 }, answer.colouring)).toEqual([]);
		expect(answer.changes).toBe(answer.colouring.filter((ink, r) => ink !== from[r]).length);
	});

	it('says that the borders alone force it, and how many inks would do', () => {
		const problem: ColouringProblem = { regions: 5, borders: wheel, inks: 'fewest' };
		const from = Int32Array.of(0, 1, 2, 1, 2);
		expect(partInks({ problem, unsafe: [[1, 2]], inks: 3, from })).toEqual({
			...{ status: 'impossible', locks: [], rules: [], inks: 3, inksThatWouldDo: 4 },
		});
	});

	it('keeps within a number of inks that the rules set, though the palette has more', () => {
		const problem: ColouringProblem = { regions: 5, borders: wheel, inks: 3 };
		const from = Int32Array.of(0, 1, 2, 1, 2);
		const answer = partInks({ problem, unsafe: [[1, 2]], inks: 8, from });
		expect(answer).toMatchObject({ status: 'impossible', inks: 3 });
	});

	it('names the locks that force two unsafe inks to touch, and no others', () => {
		const problem: ColouringProblem = {
			...{ regions: 5, borders: wheel, inks: 'fewest' },
			locks: locks(0, 1, 2, -1, -1),
		};
		const answer = partInks({ problem, unsafe: [[1, 2]], inks: 5, from: locks(0, 1, 2, 1, 2) });
		expect(answer).toMatchObject({ status: 'impossible', locks: [1, 2], rules: [] });
	});

	it('names rules of other kinds as well', () => {
		const problem: ColouringProblem = {
			...{ regions: 2, borders: pairs([[0, 1]]), inks: 3 },
			forbidden: [
				[0, 0],
				[1, 0],
				[0, 2],
			],
			alike: [],
			reserved: [],
		};
		const answer = partInks({ problem, unsafe: [[1, 2]], inks: 3, from: locks(1, 2) });
		expect(answer).toMatchObject({ status: 'impossible', locks: [] });
		if (answer.status !== 'impossible') return;
		expect(answer.rules.every(({ kind }) => kind === 'forbidden')).toBe(true);
		expect(answer.rules.length).toBeGreaterThan(0);
	});

	it('gives up on maps too large for it, in words', () => {
		const problem: ColouringProblem = { regions: 200_000, borders: pairs([]), inks: 4 };
		const from = new Int32Array(200_000);
		expect(partInks({ problem, unsafe: [[0, 1]], inks: 4, from })).toMatchObject({
			status: 'undecided',
		});
	});

	it('lets inks meet that are kept apart by a rule but share no border', () => {
		const problem: ColouringProblem = { regions: 2, borders: pairs([]), inks: 2, apart: [[0, 1]] };
		const answer = partInks({ problem, unsafe: [[0, 1]], inks: 2, from: locks(0, 1) });
		expect(answer).toMatchObject({ status: 'parted', changes: 0 });
	});

	it('agrees with trying everything, on small maps with rules', () => {
		const ink = fc.integer({ min: -1, max: 3 });
		const region = fc.integer({ min: 0, max: 5 });
		fc.assert(
			fc.property(
				...[fc.integer({ min: 0, max: 999 }), fc.array(ink, { minLength: 6, maxLength: 6 })],
				...[fc.array(fc.tuple(region, region), { maxLength: 2 }), fc.integer({ min: 2, max: 4 })],
				fc.array(fc.integer({ min: 0, max: 3 }), { maxLength: 1 }),
				(seed, locked, alike, inks, reserved) => {
					const { borders } = randomTriangulation(6, seed);
					const problem: ColouringProblem = {
						...{ regions: 6, borders, inks, reserved },
						locks: Int32Array.from(locked, (one, r) => (r % 2 ? -1 : one)),
						alike: alike.filter(([a, b]) => a !== b),
					};
					const unsafe: [number, number][] = [[0, 1]];
					const from = new Int32Array(6).fill(-1);
					const answer = partInks({ problem, unsafe, inks, from });
					const possible = everything(6, inks).some(
						(colouring) => checkParting({ problem, unsafe, inks }, colouring).length === 0,
					);
					expect(answer.status).toBe(possible ? 'parted' : 'impossible');
				},
			),
			{ numRuns: 60 },
		);
	});

	it('stays near to what there is on a map of two hundred regions', async () => {
		const { regions, borders } = randomTriangulation(200, 4);
		const problem: ColouringProblem = { regions, borders, inks: 6 };
		const before = await colour(problem);
		if (before.status !== 'coloured') expect.fail('not coloured');
		const answer = partInks({ problem, unsafe: [[0, 1]], inks: 6, from: before.colouring });
		if (answer.status !== 'parted') expect.fail(answer.status);
		// far nearer than what is found from nothing, and some must change: unsafe inks touch now
		const nothing = new Int32Array(regions).fill(-1);
		const afresh = partInks({ problem, unsafe: [[0, 1]], inks: 6, from: nothing });
		if (afresh.status !== 'parted') expect.fail(afresh.status);
		const differs = (ink: number, region: number) => ink !== before.colouring[region];
		expect(answer.changes).toBeLessThan(0.75 * afresh.colouring.filter(differs).length);
		expect(answer.changes).toBeGreaterThan(0);
	});
});

it('a colouring with a fault is told as one', () => {
	const problem: ColouringProblem = { regions: 2, borders: pairs([[0, 1]]), inks: 3 };
	const question = { problem, unsafe: [[1, 2]] as [number, number][], inks: 2 };
	expect(checkParting(question, Int32Array.of(1, 2))).toEqual([
		'Ink 2 is used, but the palette has 2 inks.',
		'Inks 1 and 2 touch on border 0.',
	]);
	expect(checkParting(question, Int32Array.of(0, 0))[0]).toMatch(/same ink/);
	expect(checkParting(question, Int32Array.of(0, 1))).toEqual([]);
});

function everything(regions: number, inks: number): Int32Array[] {
	return Array.from({ length: inks ** regions }, (_, code) =>
		Int32Array.from({ length: regions }, (_, r) => Math.floor(code / inks ** r) % inks),
	);
}
