import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { loadProgramSolver } from './integer-program.ts';
import { minimumHittingSet } from './integer.ts';
import { randomFrom } from './random.ts';

/** Every subset of the elements tried. */
function bruteForce(sets: number[][], costs: number[]): number {
	let best = Infinity;
	for (let bits = 0; bits < 1 << costs.length; bits++) {
		if (!sets.every((set) => set.some((element) => (bits >> element) & 1))) continue;
		const cost = costs.reduce((sum, each, element) => sum + ((bits >> element) & 1) * each, 0);
		if (cost < best) best = cost;
	}
	return best;
}

const ELEMENTS = 9;
const someSets = fc.array(
	fc.array(fc.integer({ min: 0, max: ELEMENTS - 1 }), { minLength: 1, maxLength: 4 }),
	{ maxLength: 14 },
);
const someCosts = fc.array(fc.integer({ min: 1, max: 5 }), {
	minLength: ELEMENTS,
	maxLength: ELEMENTS,
});

/** Random triples over many elements: too much for a few steps of branch and bound. */
function triples(elements: number, count: number): number[][] {
	const random = randomFrom(11);
	const pick = () => Math.floor(random() * elements);
	return Array.from({ length: count }, () => [pick(), pick(), pick()]);
}

describe('minimumHittingSet', () => {
	it('finds the cheapest, as trying everything does', async () => {
		await fc.assert(
			fc.asyncProperty(someSets, someCosts, async (sets, costs) => {
				const { chosen, cost, proved, lowerBound } = await minimumHittingSet(sets, costs);
				expect(sets.every((set) => set.some((element) => chosen.includes(element)))).toBe(true);
				expect(cost).toBe(bruteForce(sets, costs));
				expect(chosen.reduce((sum, element) => sum + costs[element], 0)).toBe(cost);
				expect([proved, lowerBound]).toEqual([true, cost]);
			}),
			{ numRuns: 300 },
		);
	});

	it('agrees with HiGHS (npm highs) on larger problems, by either way', async () => {
		const sets = triples(36, 50);
		const costs = Array.from({ length: 36 }, (_, element) => 1 + (element % 3));
		const own = await minimumHittingSet(sets, costs, { steps: 1_000_000 });
		const program = (await loadProgramSolver())(sets, costs, 20_000);
		const byProgram = program?.chosen.reduce((sum, element) => sum + costs[element], 0);
		expect(own.proved).toBe(true);
		expect(byProgram).toBe(own.cost);
		const small = await minimumHittingSet(sets, costs, { steps: 3 });
		expect([small.cost, small.proved]).toEqual([own.cost, true]);
		const hasty = await minimumHittingSet(sets, costs, { steps: 3, nodes: 1 });
		expect(hasty.lowerBound).toBeLessThanOrEqual(own.cost);
		expect(hasty.cost).toBeGreaterThanOrEqual(own.cost);
	});

	it('covers a ring of n pairs with half of them (rounded up), a star with its middle', async () => {
		const ring = Array.from({ length: 41 }, (_, i) => [i, (i + 1) % 41]);
		expect((await minimumHittingSet(ring, new Float64Array(41).fill(1))).cost).toBe(21);
		const star = Array.from({ length: 40 }, (_, i) => [0, i + 1]);
		expect((await minimumHittingSet(star, new Float64Array(41).fill(1))).chosen).toEqual([0]);
	});

	it('refuses what cannot be met and what costs nothing', async () => {
		await expect(minimumHittingSet([[]], [])).rejects.toThrow(RangeError);
		await expect(minimumHittingSet([[0]], [0])).rejects.toThrow(RangeError);
		expect((await minimumHittingSet([], [])).chosen).toEqual([]);
	});
});
