import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { feasible } from '../../../../tests/support/brute-force.ts';
import { checkExplanation } from './explain-check.ts';
import { explain } from './explain.ts';
import type { ColouringProblem } from './problem.ts';

const pairsOf = (regions: number, most: number) =>
	fc
		.array(fc.tuple(fc.nat(regions - 1), fc.nat(regions - 1)), { maxLength: most })
		.map((pairs) => pairs.filter(([a, b]) => a !== b));

/** Any problem of up to eight regions: borders at random, locks on most, a few rules of every kind. */
const problems = fc.integer({ min: 1, max: 8 }).chain((regions) =>
	fc
		.record({
			pairs: pairsOf(regions, 16),
			inks: fc.oneof(
				{ weight: 9, arbitrary: fc.integer({ min: 1, max: 4 }) },
				fc.constant('fewest' as const),
			),
			locks: fc.array(fc.integer({ min: -2, max: 3 }), { minLength: regions, maxLength: regions }),
			costs: fc.array(fc.integer({ min: 1, max: 4 }), { minLength: regions, maxLength: regions }),
			forbidden: fc.array(fc.tuple(fc.nat(regions - 1), fc.nat(3)), { maxLength: 3 }),
			reserved: fc.oneof(fc.constant([]), fc.array(fc.nat(3), { maxLength: 2 })),
			alike: pairsOf(regions, 2),
			apart: pairsOf(regions, 2),
			weighed: fc.boolean(),
		})
		.map(({ pairs, locks, costs, weighed, ...rest }): ColouringProblem => ({
			...rest,
			regions,
			borders: { a: pairs.map((pair) => pair[0]), b: pairs.map((pair) => pair[1]) },
			locks: Int32Array.from(locks, (ink) => Math.max(-1, ink)),
			...(weighed ? { lockCosts: Float64Array.from(costs) } : {}),
		})),
);

/** Crowded maps of free and locked regions without other rules, where collisions take several locks. */
const crowded = fc.record({
	pairs: pairsOf(9, 26),
	locks: fc.array(fc.integer({ min: -1, max: 2 }), { minLength: 9, maxLength: 9 }),
	free: fc.array(fc.nat(8), { maxLength: 5 }),
});

/** More inks than any of these problems can use. */
const PLENTY = 13;
const inksOf = ({ inks }: ColouringProblem) => (inks === 'fewest' ? PLENTY : inks);

const dropping = (problem: ColouringProblem, dropped: number[]): ColouringProblem => ({
	...problem,
	locks: problem.locks?.map((ink, r) => (dropped.includes(r) ? -1 : ink)),
});

/** What the cheapest release costs, every set of locks tried; infinite when none helps. */
function cheapest(problem: ColouringProblem): number {
	const locked = [...(problem.locks ?? [])].flatMap((ink, r) => (ink >= 0 ? [r] : []));
	let best = Infinity;
	for (let bits = 0; bits < 1 << locked.length; bits++) {
		const dropped = locked.filter((_, i) => (bits >> i) & 1);
		const cost = dropped.reduce((sum, r) => sum + (problem.lockCosts?.[r] ?? 1), 0);
		if (cost < best && feasible(dropping(problem, dropped), inksOf(problem))) best = cost;
	}
	return best;
}

function smallestThatDoes(problem: ColouringProblem): number | null {
	if (problem.inks === 'fewest') return null;
	for (let inks = problem.inks + 1; inks <= PLENTY; inks++)
		if (feasible(problem, inks)) return inks;
	return null;
}

describe('explain against trying everything', () => {
	it('tells what is impossible, why, and the cheapest way out', async () => {
		await fc.assert(
			fc.asyncProperty(problems, async (problem) => {
				const explanation = await explain(problem);
				expect(explanation === null).toBe(feasible(problem, inksOf(problem)));
				if (!explanation) return;
				expect(await checkExplanation(problem, explanation)).toEqual([]);
				const { locks, release, inksThatWouldDo } = explanation;
				const others = [...problem.locks!.keys()].filter((r) => !locks.includes(r));
				const without = (dropped: number[]) =>
					feasible(dropping(problem, dropped), inksOf(problem), problem.locks);
				expect(without(others)).toBe(false);
				for (const lock of locks) {
					expect(without([...others, lock])).toBe(true);
				}
				const cost = cheapest(problem);
				expect(release?.cost ?? Infinity).toBe(cost);
				if (release) {
					expect([release.proved, release.lowerBound]).toEqual([true, cost]);
					expect(feasible(dropping(problem, release.locks), inksOf(problem))).toBe(true);
				}
				expect(inksThatWouldDo).toBe(smallestThatDoes(problem));
			}),
			{ numRuns: 300 },
		);
	});

	it('finds collisions of several locks with free regions between them', async () => {
		const sizes = new Set<number>();
		await fc.assert(
			fc.asyncProperty(crowded, async ({ pairs, locks, free }) => {
				const ordered = properLocks(pairs, locks, free);
				const borders = { a: pairs.map((pair) => pair[0]), b: pairs.map((pair) => pair[1]) };
				const problem: ColouringProblem = { regions: 9, borders, inks: 3, locks: ordered };
				const explanation = await explain(problem);
				expect(explanation === null).toBe(feasible(problem, 3));
				if (!explanation) return;
				expect(await checkExplanation(problem, explanation)).toEqual([]);
				expect(explanation.release?.cost ?? Infinity).toBe(cheapest(problem));
				sizes.add(explanation.locks.length);
			}),
			{ numRuns: 600, seed: 1 },
		);
		expect(Math.max(...sizes)).toBeGreaterThanOrEqual(3);
	});
});

/** The locks without those that would collide at sight. */
function properLocks(pairs: [number, number][], locks: number[], free: number[]): Int32Array {
	const kept = Int32Array.from(locks);
	for (const r of free) kept[r] = -1;
	for (const [a, b] of pairs) if (kept[a] === kept[b]) kept[a] = -1;
	return kept;
}
