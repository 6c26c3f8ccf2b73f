import { describe, expect, it } from 'vitest';
import { gridGraph, plainProblem } from '../../../../tests/support/territories.ts';
import { checkPlan } from './check-plan.ts';
import type { Proposed, TerritoryProblem, Watch } from './problem.ts';
import { rebalance } from './rebalance.ts';

/** A square cut into square quarters, or by `divide`, with the given bases. */
function squares(
	side: number,
	divide: (x: number, y: number) => number,
	bases: number[],
	tolerance = 0.1,
): TerritoryProblem {
	const graph = gridGraph(side);
	const today = Int32Array.from({ length: side * side }, (_, i) =>
		divide(i % side, Math.floor(i / side)),
	);
	const load = new Float64Array(side * side).fill(1);
	return { ...plainProblem(graph, load, today, bases, tolerance), effort: 'quick' };
}

const quarters = (half: number) => (x: number, y: number) =>
	(x < half ? 0 : 1) + (y < half ? 0 : 2);

async function planFor(problem: TerritoryProblem, watch?: Watch): Promise<Proposed> {
	const result = await rebalance(problem, watch);
	if (result.status !== 'proposed') throw new Error(`${result.status}: ${result.message}`);
	expect(checkPlan(problem, result)).toEqual([]);
	return result;
}

describe('rebalance', () => {
	it('leaves alone what is within tolerance, and proves that nothing need move', async () => {
		const plan = await planFor(squares(8, quarters(4), [0, 7, 56, 63]));
		expect(plan.moves).toEqual([]);
		expect([plan.lowerBound, plan.proved]).toEqual([0, true]);
	});

	it('hands a leaver’s units on, each a compulsory move', async () => {
		const problem = squares(8, quarters(4), [0, 7, 56, -1]);
		problem.territories[3].closing = true;
		const plan = await planFor(problem);
		expect(plan.moves.filter(({ compulsory }) => compulsory)).toHaveLength(16);
		expect(plan.assignment).not.toContain(3);
	});

	it('grows a new hire from the base alone', async () => {
		const problem = squares(8, (x, y) => (x === 7 && y === 7 ? 2 : x < 4 ? 0 : 1), [0, 7, 63]);
		const plan = await planFor(problem);
		const grown = plan.assignment.filter((t) => t === 2).length;
		expect(Math.abs(grown / (64 / 3) - 1)).toBeLessThanOrEqual(0.1);
	});

	it('starts a territory that has neither base nor unit', async () => {
		const problem = squares(8, (x) => (x < 4 ? 0 : 1), [0, 7, -1]);
		const plan = await planFor(problem);
		expect(plan.assignment).toContain(2);
	});

	it('mends a torn territory by the cheaper of giving away and linking', async () => {
		// a single cell of the first quarter lies in the far corner of the last one
		const stray = squares(
			8,
			(x, y) => (x === 7 && y === 7 ? 0 : quarters(4)(x, y)),
			[0, 7, 56, 45],
		);
		const plan = await planFor(stray);
		expect(plan.moves).toEqual([{ unit: 63, from: 0, to: 3, compulsory: true }]);
	});

	it('says by how much a stopped run fails, with the best so far', async () => {
		const problem = squares(16, (x) => (x < 11 ? 0 : 1), [0, 15]);
		const result = await rebalance(problem, { cancelled: () => true });
		expect(result.status).toBe('undecided');
		if (result.status !== 'undecided') return;
		expect(result.message).toBe(
			'The run was stopped. Territory @0 stays 37.5 % over; 10 % is allowed. 2 territories are outside.',
		);
		expect(checkPlan(problem, result.best!, { tolerances: false })).toEqual([]);
	});

	it('tells how far it is by shares that never fall', async () => {
		const shares: number[] = [];
		const progress = (_: string, share: number) => shares.push(share);
		await planFor(
			squares(16, (x) => (x < 11 ? 0 : 1), [0, 15]),
			{ progress },
		);
		expect(shares.length).toBeGreaterThan(4);
		expect(shares.every((share, i) => share <= 1 && share >= (shares[i - 1] ?? 0))).toBe(true);
	});
});
