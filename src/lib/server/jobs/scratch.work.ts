import type { RegionGraph } from '../../engines/graph/index.ts';
import {
	checkPlan,
	fromScratch,
	type Measure,
	type Plan,
	type TerritoryProblem,
} from '../../engines/territories/index.ts';
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
 * So many territories in one piece each, about even in one measure. Looked over by the checker before it
 * is answered.
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
	const plan = await widening(graph, load, territories, seed);
	if (!plan) {
		const message = `The regions cannot be cut into ${territories} territories in one piece each.`;
		return refused('not-cut', `${message} Join islands by links, or ask for another number.`);
	}
	const assignment = Array.from(plan.assignment);
	return { status: 'made', assignment, heaviest: heaviestOf(assignment, load, territories) };
}

/** Within a tenth of even where that can be, else as near as a wider tolerance gives; checked. */
async function widening(
	graph: RegionGraph,
	values: Float64Array,
	count: number,
	seed: number,
): Promise<Plan | null> {
	for (const tolerance of [0.1, 0.3, 1, count]) {
		const measures = [{ name: 'load', values, tolerance }];
		const result = await fromScratch({ graph, measures, count, seed, effort: 'normal' });
		const plan = result.status === 'undecided' ? result.best : result;
		if (!plan || !('assignment' in plan)) continue;
		const faults = checkPlan(emptyProblem(graph, measures, count, seed), plan, {
			tolerances: false,
		});
		if (faults.length > 0) throw new Error(`the checker refused: ${faults.join(' ')}`);
		return plan;
	}
	return null;
}

const refused = (code: string, message: string): ScratchOutcome => ({
	...{ status: 'refused', code, message },
});

/** What the checker holds such a plan against: territories that are empty today. */
const emptyProblem = (
	graph: RegionGraph,
	measures: Measure[],
	count: number,
	seed: number,
): TerritoryProblem => ({
	...{ graph, measures, seed },
	today: new Int32Array(graph.count).fill(-1),
	territories: Array.from({ length: count }, () => ({
		...{ base: -1, capacity: 1, frozen: false, closing: false },
	})),
	...{ goal: 'fewest-moves', reach: null, effort: 'normal' },
});

function heaviestOf(assignment: number[], load: Float64Array, territories: number): number[] {
	const heaviest = new Array<number>(territories).fill(-1);
	assignment.forEach((t, unit) => {
		if (heaviest[t] < 0 || load[unit] > load[heaviest[t]]) heaviest[t] = unit;
	});
	return heaviest;
}
