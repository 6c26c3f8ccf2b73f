import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gridGraph, grownTerritories, logNormal } from '../../../../tests/support/territories.ts';
import { randomFrom } from '../solver/random.ts';
import { checkPlan } from './check-plan.ts';
import { checkWitness } from './check-witness.ts';
import { planFrom } from './plan-from.ts';
import { preCheck } from './pre-check.ts';
import { prepare } from './prepared.ts';
import type { RebalanceResult, Territory, TerritoryProblem } from './problem.ts';
import { rebalance } from './rebalance.ts';
import { search } from './search.ts';

const casesOf = (least: number, most: number) =>
	fc.record({
		side: fc.integer({ min: least, max: most }),
		count: fc.integer({ min: 2, max: 7 }),
		seed: fc.integer({ min: 0, max: 1e6 }),
		tolerance: fc.constantFrom(0.1, 0.2, 0.4),
		measures: fc.integer({ min: 1, max: 2 }),
		reach: fc.constantFrom(null, 1, 2),
		goal: fc.constantFrom('fewest-moves' as const, 'least-deviation' as const),
		rules: fc.boolean(),
	});
type Case = ReturnType<typeof casesOf> extends fc.Arbitrary<infer T> ? T : never;

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
			fc.asyncProperty(casesOf(3, 5), async (c) => {
				const problem = problemOf(c);
				const result = await rebalance(problem);
				tally[result.status] = (tally[result.status] ?? 0) + 1;
				expect(faultsOf(problem, result)).toEqual([]);
			}),
			{ numRuns: 30, seed: 11, endOnFailure: true },
		);
		expect(tally.proposed).toBeGreaterThan(8);
		expect(tally.impossible).toBeGreaterThan(0);
	});
});

describe('the search', () => {
	it('keeps every rule but tolerance in whatever it ends with', async () => {
		let sound = 0;
		await fc.assert(
			fc.asyncProperty(casesOf(6, 14), async (c) => {
				const prepared = prepare(problemOf(c));
				if ('status' in prepared || preCheck(prepared)) return;
				const found = await search(prepared);
				if (!found || found.conflicts > 0) return;
				if (found.sound) sound++;
				const plan = planFrom(prepared, found.assignment);
				expect(checkPlan(prepared.problem, plan, { tolerances: found.sound })).toEqual([]);
			}),
			{ numRuns: 50, seed: 3, endOnFailure: true },
		);
		expect(sound).toBeGreaterThan(15);
	});

	it('finds the same for the same seed', async () => {
		await fc.assert(
			fc.asyncProperty(casesOf(5, 9), async (c) => {
				const [one, two] = [prepare(problemOf(c)), prepare(problemOf(c))];
				if ('status' in one || 'status' in two) return;
				expect(await search(one)).toEqual(await search(two));
			}),
			{ numRuns: 8, seed: 5 },
		);
	});
});
