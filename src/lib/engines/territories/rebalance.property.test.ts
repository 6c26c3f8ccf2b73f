import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gridGraph, grownTerritories, logNormal } from '../../../../tests/support/territories.ts';
import { randomFrom } from '../solver/random.ts';
import { checkPlan } from './check-plan.ts';
import { checkWitness } from './check-witness.ts';
import type { RebalanceResult, Territory, TerritoryProblem } from './problem.ts';
import { rebalance } from './rebalance.ts';

const cases = fc.record({
	side: fc.integer({ min: 4, max: 9 }),
	count: fc.integer({ min: 2, max: 7 }),
	seed: fc.integer({ min: 0, max: 1e6 }),
	tolerance: fc.constantFrom(0.1, 0.2, 0.4),
	measures: fc.integer({ min: 1, max: 2 }),
	reach: fc.constantFrom(null, 1, 2),
	goal: fc.constantFrom('fewest-moves' as const, 'least-deviation' as const),
	rules: fc.boolean(),
});
type Case = typeof cases extends fc.Arbitrary<infer T> ? T : never;

/** A random land with, where `rules` says so, every kind of rule and of trouble in it. */
function problemOf({ side, count, seed, tolerance, measures, reach, goal, rules }: Case) {
	const random = randomFrom(seed);
	const graph = gridGraph(side);
	const draw = () => Math.floor(random() * graph.count);
	const { today, bases } = grownTerritories(
		graph,
		new Float64Array(graph.count).fill(1),
		count,
		seed,
	);
	const territories: Territory[] = bases.map((base) => ({
		base: random() < 0.7 ? base : -1,
		capacity: random() < 0.8 ? 1 : 0.5,
		frozen: rules && random() < 0.1,
		closing: false,
	}));
	const problem: TerritoryProblem = {
		graph,
		measures: Array.from({ length: measures }, (_, m) => ({
			name: `measure ${m}`,
			values: logNormal(graph.count, 0.4, seed + m),
			tolerance,
		})),
		today,
		territories,
		reach,
		goal,
		seed,
		effort: 'quick',
	};
	if (!rules) return problem;
	if (count > 3) territories[1] = { base: -1, capacity: 1, frozen: false, closing: true };
	const locks = new Int32Array(graph.count).fill(-1);
	for (let i = 0; i < 3; i++) {
		const unit = draw();
		if (today[unit] >= 0 && !territories[today[unit]].closing) locks[unit] = today[unit];
	}
	for (let i = 0; i < 3; i++) today[draw()] = random() < 0.5 ? -1 : Math.floor(random() * count);
	const pair = () => {
		const unit = Math.floor(random() * (graph.count - 1));
		return [unit, (unit + 1) % side === 0 ? unit + side : unit + 1] as const;
	};
	const inside = ([a, b]: readonly [number, number]) => a < graph.count && b < graph.count;
	return {
		...problem,
		locks,
		together: [pair(), pair()].filter(inside),
		apart: [pair()].filter(inside),
		cost: Float64Array.from({ length: graph.count }, () => Math.ceil(random() * 5)),
	};
}

/** Everything wrong with an answer, by the checkers, which share no code with the search. */
function faultsOf(problem: TerritoryProblem, result: RebalanceResult): string[] {
	if (result.status === 'proposed') return checkPlan(problem, result);
	if (result.status === 'impossible') return checkWitness(problem, result);
	if (!result.message) return ['no word on why it is undecided'];
	return result.best ? checkPlan(problem, result.best, { tolerances: false }) : [];
}

describe('rebalance', () => {
	it('answers what its checkers accept, whatever the rules', async () => {
		const tally: Record<string, number> = {};
		await fc.assert(
			fc.asyncProperty(cases, async (c) => {
				const problem = problemOf(c);
				const result = await rebalance(problem);
				tally[result.status] = (tally[result.status] ?? 0) + 1;
				expect(faultsOf(problem, result)).toEqual([]);
			}),
			{ numRuns: 60, seed: 11 },
		);
		expect(tally.proposed).toBeGreaterThan(15);
	});

	it('answers the same for the same seed', async () => {
		await fc.assert(
			fc.asyncProperty(cases, async (c) => {
				expect(await rebalance(problemOf(c))).toEqual(await rebalance(problemOf(c)));
			}),
			{ numRuns: 8, seed: 5 },
		);
	});
});
