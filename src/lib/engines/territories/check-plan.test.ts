import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import {
	everyAssignment,
	smallProblems,
	territory,
} from '../../../../tests/support/small-territories.ts';
import { buildGraph } from '../graph/build-graph.ts';
import { checkPlan } from './check-plan.ts';
import { ruleFaults } from './check-rules.ts';
import { planFrom } from './plan-from.ts';
import { mayEndIn } from './prepare.ts';
import { prepare } from './prepared.ts';
import type { Proposed, TerritoryProblem } from './problem.ts';

/** Two rows of four, three territories: @0 frozen on the left, @2 a leaver's on the right. */
const problem: TerritoryProblem = {
	graph: buildGraph(8, [0, 1, 2, 4, 5, 6, 0, 1, 2, 3], [1, 2, 3, 5, 6, 7, 4, 5, 6, 7]),
	measures: [{ name: 'visits', values: new Float64Array(8).fill(1), tolerance: 0.5 }],
	today: Int32Array.of(0, 1, 3, 2, 0, 1, 3, -1),
	territories: [
		territory({ frozen: true }),
		territory({ base: 1 }),
		territory({ closing: true }),
		territory({ base: 6 }),
	],
	goal: 'fewest-moves',
	reach: 1,
	seed: 1,
	effort: 'quick',
};

function proposed(): Proposed {
	const prepared = prepare(problem);
	if ('status' in prepared) throw new Error(prepared.message);
	const plan = planFrom(prepared, Int32Array.of(0, 1, 3, 3, 0, 1, 3, 3));
	return { status: 'proposed', ...plan, lowerBound: 2, proved: true };
}

describe('the checker of plans', () => {
	it('finds nothing wrong with an honest plan', () => {
		expect(checkPlan(problem, proposed())).toEqual([]);
	});

	const assign = (...changes: [number, number][]) => {
		const assignment = proposed().assignment;
		for (const [unit, to] of changes) assignment[unit] = to;
		return { assignment };
	};
	const [first, second] = proposed().moves;
	it.each<[string, Partial<Proposed>, RegExp]>([
		['a frozen territory entered', assign([1, 0]), /joined frozen @0/],
		['a frozen territory left', assign([4, 1]), /left frozen @0/],
		['a leaver kept', assign([3, 2]), /@2 closes but has #3/],
		['a base lost', assign([6, 1]), /@3 has lost its base #6/],
		['a torn territory', assign([2, 1], [6, 1], [3, 1], [1, 3]), /lost its base|torn/],
		['a piece cut off', assign([7, 1]), /@1 is torn: #7/],
		['a territory without units', assign([1, 3], [5, 3]), /@1 stays but has no unit/],
		['a tolerance broken', assign([5, 3]), /% from its target of visits/],
		['a unit without territory', assign([0, -1]), /no territory of the problem/],
		['a move hidden', { moves: [first] }, /not listed/],
		['a move made up', { moves: [first, second, { ...first, unit: 0 }] }, /stays in @0/],
		['a move twice', { moves: [first, first, second] }, /listed twice/],
		['a free move', { moves: [{ ...first, compulsory: false }, second] }, /is compulsory/],
		['a wrong cost', { cost: 3 }, /cost 2, not 3/],
		['a wrong compulsory cost', { compulsoryCost: 1 }, /Compulsory moves cost 2, not 1/],
		['a wrong deviation', { deviations: [new Float64Array(4)] }, /deviation of @/],
		['wrong cut borders', { cutBorders: { before: 1, after: 5 } }, /borders cut before/],
		['a bound above the cost', { lowerBound: 2.5 }, /bound 2.5 is above/],
		['a proof without its bound', { lowerBound: 1 }, /said to be proved/],
	])('sees %s', (_, change, fault) => {
		expect(checkPlan(problem, { ...proposed(), ...change }).join('\n')).toMatch(fault);
	});

	it('leaves tolerances to those who ask', () => {
		const plan = { ...proposed(), ...assign([5, 3]) };
		expect(checkPlan(problem, plan).join('\n')).toMatch(/% from its target/);
		expect(checkPlan(problem, plan, { tolerances: false }).join('\n')).not.toMatch(
			/% from its target/,
		);
	});

	it('agrees with the plans written out and with the rules on single units', () => {
		fc.assert(
			fc.property(smallProblems(5), (small) => {
				const prepared = prepare(small);
				if ('status' in prepared) return;
				for (const assignment of everyAssignment(small)) {
					if (ruleFaults(small, assignment).length > 0) continue;
					expect(checkPlan(small, planFrom(prepared, assignment))).toEqual([]);
					assignment.forEach((t, u) => expect(mayEndIn(prepared, u, t)).toBe(true));
				}
			}),
			{ numRuns: 300 },
		);
	});
});
