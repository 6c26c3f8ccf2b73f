import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { feasible } from '../../../../tests/support/brute-force.ts';
import { plainRelease } from '../../../../tests/support/plain-release.ts';
import { scatteredMap } from '../../../../tests/support/planar.ts';
import { checkExplanation } from './explain-check.ts';
import { explain } from './explain.ts';
import type { ColouringProblem, Release } from './problem.ts';
import { Random } from './random.ts';

/** Weights as people set them and as they come from areas or money. */
const weights = [1, 1, 2, 3, 0.25, 7.5, 12.125, 100];

/** A planar map with locks of different weights, and a few rules of every kind. */
function weighedProblem(regions: number, seed: number): ColouringProblem {
	const map = scatteredMap(regions, seed);
	const random = new Random(seed + 1);
	const region = () => random.below(map.regions);
	const locks = new Int32Array(map.regions).fill(-1);
	const lockCosts = new Float64Array(map.regions).fill(1);
	for (let i = 0; i < map.regions / 2; i++) {
		const r = region();
		locks[r] = random.below(4);
		lockCosts[r] = weights[random.below(weights.length)];
	}
	const pairs = (count: number) =>
		Array.from({ length: count }, () => [region(), region()] as const).filter(([a, b]) => a !== b);
	return {
		...map,
		inks: 4,
		locks,
		lockCosts,
		forbidden: Array.from({ length: 3 }, () => [region(), random.below(4)] as const),
		alike: pairs(2),
		apart: pairs(3),
	};
}

describe('the cheapest release of weighed locks', () => {
	it('costs what one plain integer program says', async () => {
		let compared = 0;
		for (let seed = 1; seed <= 24; seed++) {
			const problem = weighedProblem(12 + seed, seed);
			const [explanation, plain] = [await explain(problem), await plainRelease(problem)];
			if (plain === null) {
				expect(explanation?.locks).toEqual([]);
				continue;
			}
			expect(explanation?.release?.cost ?? 0).toBeCloseTo(plain, 6);
			if (!explanation) continue;
			expect(explanation.release?.proved).toBe(true);
			expect(await checkExplanation(problem, explanation)).toEqual([]);
			compared++;
		}
		expect(compared).toBeGreaterThanOrEqual(10);
	});

	it('tells releases that work and bounds that hold while it looks', async () => {
		let told = 0;
		await fc.assert(
			fc.asyncProperty(fc.integer({ min: 1, max: 1e6 }), async (seed) => {
				const problem = weighedProblem(9, seed);
				const onTheWay: Release[] = [];
				const explanation = await explain({
					...problem,
					releaseFound: (soFar) => onTheWay.push(soFar),
				});
				const cost = explanation?.release?.cost;
				if (cost === undefined) {
					expect(onTheWay).toEqual([]);
					return;
				}
				told += onTheWay.length;
				onTheWay.forEach((soFar, i) => {
					const before = onTheWay[i - 1] ?? { lowerBound: 0, cost: Infinity };
					expect(soFar.lowerBound).toBeGreaterThanOrEqual(before.lowerBound);
					expect(soFar.cost).toBeLessThanOrEqual(before.cost);
					expect(soFar.lowerBound).toBeLessThanOrEqual(cost + 1e-9);
					const locks = problem.locks?.map((ink, r) => (soFar.locks.includes(r) ? -1 : ink));
					expect(feasible({ ...problem, locks }, 4)).toBe(true);
				});
				const same = await explain(problem);
				expect(same).toEqual(explanation);
			}),
			{ numRuns: 100, seed: 1 },
		);
		expect(told).toBeGreaterThan(20);
	});
});
