import type { RegionGraph } from '../graph/region-graph.ts';
import { planFrom } from './plan-from.ts';
import { preCheck } from './pre-check.ts';
import { prepare } from './prepared.ts';
import type { Measure, RebalanceResult, TerritoryProblem, Watch } from './problem.ts';
import { search } from './search.ts';
import { shortfall } from './shortfall.ts';
import { treePartition } from './tree-partition.ts';

export interface ScratchProblem {
	/** which units count as joined */
	graph: RegionGraph;
	/** those with a tolerance are evened out */
	measures: Measure[];
	/** how many territories, at least 1 */
	count: number;
	/** base of each territory, -1 for none; absent: none has one */
	bases?: readonly number[];
	/** share of a full load of each, > 0; absent: 1 each */
	capacities?: readonly number[];
	/** weight of cut borders, 0 to 1; absent: 1, since there is no today to keep */
	compactness?: number;
	/** whole number from 0 to 2^32 - 1 */
	seed: number;
	effort: TerritoryProblem['effort'];
}

/**
 * Draws territories where there are none yet: all in one piece, every measure within its tolerance, with
 * as few borders cut as the effort finds. With bases each grows from its own; without, the map is split
 * along random spanning trees (see `treeSplit`), then annealed. All units count as compulsory moves.
 * The same problem gives the same answer.
 *
 * @returns as `rebalance` does; a proposal claims nothing on the fewest cut borders
 * @throws RangeError for a programmer's error: see `validate`
 */
export async function fromScratch(
	scratch: ScratchProblem,
	watch: Watch = {},
): Promise<RebalanceResult> {
	const prepared = prepare(problemOfScratch(scratch));
	if ('status' in prepared) return prepared;
	const obstacle = preCheck(prepared);
	if (obstacle) return obstacle;
	const hasBases = scratch.bases?.some((base) => base >= 0) ?? false;
	const split = hasBases ? null : treePartition(prepared, scratch.seed);
	const found = await search(prepared, watch, split);
	const plan = found && planFrom(prepared, found.assignment);
	if (plan && found?.sound) {
		return { status: 'proposed', ...plan, lowerBound: plan.cost, proved: false };
	}
	const message = plan
		? shortfall(prepared, plan)
		: 'No division into pieces that are each joined was found.';
	return { status: 'undecided', best: plan, lowerBound: 0, message };
}

/** The same as a problem: nothing is assigned today. For checkers. */
export function problemOfScratch(scratch: ScratchProblem): TerritoryProblem {
	const { graph, measures, count, bases, capacities, compactness = 1, seed, effort } = scratch;
	return {
		graph,
		measures,
		today: new Int32Array(graph.count).fill(-1),
		territories: Array.from({ length: count }, (_, t) => ({
			base: bases?.[t] ?? -1,
			capacity: capacities?.[t] ?? 1,
			frozen: false,
			closing: false,
		})),
		goal: 'fewest-moves',
		compactness,
		reach: null,
		seed,
		effort,
	};
}
