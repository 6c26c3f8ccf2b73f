import type { RegionGraph } from '../../engines/graph/index.ts';
import { checkPlan, rebalance, type TerritoryProblem } from '../../engines/territories/index.ts';
import { joinedGraph, type TerritoryGround } from '../../engines/territories/problem-of-draft.ts';
import type { TerritoryDraft } from '../../engines/territories/territory-draft.ts';
import type { Task } from './task-port.ts';

export interface ScratchInput {
	ground: Pick<TerritoryGround, 'keys' | 'borders'>;
	/** its links count; its territories and their assignment do not */
	draft: TerritoryDraft;
	territories: number;
	/** one a region, to be evened out; null counts regions */
	values: readonly (number | null)[] | null;
	seed: number;
}

export type ScratchOutcome =
	| {
			status: 'made';
			/** territory of every region */
			assignment: number[];
			/** heaviest region of each territory */
			heaviest: number[];
	  }
	| { status: 'refused'; code: string; message: string };

/**
 * So many territories in one piece each, about even in one measure: roots spread over the map, grown and
 * evened out by the engine. Looked over by the checker before it is answered.
 */
export async function scratchPlan({ input }: Task<ScratchInput>): Promise<ScratchOutcome> {
	const { ground, draft, values, territories, seed } = input;
	const load = Float64Array.from(ground.keys, (_, unit) => (values ? (values[unit] ?? NaN) : 1));
	if (!load.every((value) => value >= 0 && value < Infinity)) {
		return refused('missing-value', 'The measure has no figure of 0 or more for every region.');
	}
	if (territories > load.length) {
		return refused('too-many-territories', `There are only ${load.length} regions.`);
	}
	const graph = joinedGraph(ground, draft);
	const problem = emptyProblem(graph, load, spreadRoots(graph, territories, seed), seed);
	const result = await rebalance(problem);
	const plan = result.status === 'undecided' ? result.best : result;
	if (!plan || !('assignment' in plan)) {
		const message = `The regions cannot be cut into ${territories} territories in one piece each.`;
		return refused('not-cut', `${message} Join islands by links, or ask for another number.`);
	}
	const faults = checkPlan(problem, plan, { tolerances: false });
	if (faults.length > 0) throw new Error(`the checker refused: ${faults.join(' ')}`);
	const assignment = Array.from(plan.assignment);
	return { status: 'made', assignment, heaviest: heaviestOf(assignment, load, territories) };
}

const refused = (code: string, message: string): ScratchOutcome => ({
	...{ status: 'refused', code, message },
});

const emptyProblem = (
	graph: RegionGraph,
	values: Float64Array,
	roots: number[],
	seed: number,
): TerritoryProblem => ({
	graph,
	measures: [{ name: 'load', values, tolerance: 0.1 }],
	today: new Int32Array(graph.count).fill(-1),
	territories: roots.map((base) => ({ base, capacity: 1, frozen: false, closing: false })),
	...{ goal: 'least-deviation', reach: null, seed, effort: 'normal' },
});

/** Units far from each other: each the farthest in steps from all before it, one in every island first. */
function spreadRoots(graph: RegionGraph, count: number, seed: number): number[] {
	const steps = new Float64Array(graph.count).fill(Infinity);
	const roots = [seed % graph.count];
	for (;;) {
		shorten(graph, steps, roots[roots.length - 1]);
		if (roots.length === count) return roots;
		roots.push(steps.reduce((far, distance, unit) => (distance > steps[far] ? unit : far), 0));
	}
}

/** Lowers `steps` to the distance from `root` where that is less. */
function shorten({ offsets, targets }: RegionGraph, steps: Float64Array, root: number): void {
	steps[root] = 0;
	const waiting = [root];
	for (const unit of waiting) {
		for (const next of targets.subarray(offsets[unit], offsets[unit + 1])) {
			if (steps[next] <= steps[unit] + 1) continue;
			steps[next] = steps[unit] + 1;
			waiting.push(next);
		}
	}
}

function heaviestOf(assignment: number[], load: Float64Array, territories: number): number[] {
	const heaviest = new Array<number>(territories).fill(-1);
	assignment.forEach((t, unit) => {
		if (heaviest[t] < 0 || load[unit] > load[heaviest[t]]) heaviest[t] = unit;
	});
	return heaviest;
}
