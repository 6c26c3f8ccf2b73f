import { independentParts, reduceSets } from './hitting-reductions.ts';
import { costOf, greedyHittingSet, HittingSearch, packingBound } from './hitting-search.ts';
import { loadProgramSolver, type ProgramAnswer } from './integer-program.ts';

export interface HittingSet {
	/** the elements chosen, ascending */
	chosen: number[];
	cost: number;
	/** no hitting set costs less */
	lowerBound: number;
	/** true when `chosen` is a cheapest one */
	proved: boolean;
	/** sets handed to the integer program, as a measure of effort */
	rows: number;
}

const OWN_STEPS = 1500;
const PROGRAM_NODES = 20_000;

/**
 * The cheapest elements that meet every set. `sets` hold numbers from 0; `costs[element]` is positive.
 *
 * Independent parts are solved apart: by branch and bound, and where `steps` nodes do not suffice by
 * the integer program solver with `nodes` nodes, which is loaded only then. What it chooses is checked
 * to meet every set, so a failure of the program costs the proof (`proved` false), never the answer.
 * @throws RangeError when a set is empty or a cost is not positive.
 */
export async function minimumHittingSet(
	sets: readonly (readonly number[])[],
	costs: ArrayLike<number>,
	{ steps = OWN_STEPS, nodes = PROGRAM_NODES }: { steps?: number; nodes?: number } = {},
): Promise<HittingSet> {
	mustBeSound(sets, costs);
	const { forced, rest } = reduceSets(sets, costs);
	const forcedCost = costOf(forced, costs);
	const result = {
		chosen: forced,
		cost: forcedCost,
		lowerBound: forcedCost,
		proved: true,
		rows: 0,
	};
	for (const part of independentParts(rest)) {
		const search = new HittingSearch(costs, steps);
		const own = search.below(part, Infinity);
		const done = own && !search.exhausted;
		if (!done) result.rows += part.length;
		const answer = done
			? { chosen: own, proved: true, lowerBound: 0 }
			: await byProgram(part, costs, own, nodes);
		const cost = costOf(answer.chosen, costs);
		result.chosen.push(...answer.chosen);
		result.cost += cost;
		result.lowerBound += answer.proved ? cost : answer.lowerBound;
		result.proved &&= answer.proved;
	}
	result.chosen.sort((a, b) => a - b);
	return result;
}

function mustBeSound(sets: readonly (readonly number[])[], costs: ArrayLike<number>): void {
	for (const set of sets) {
		if (set.length === 0) throw new RangeError('nothing can meet an empty set');
		for (const element of set) {
			if (!(costs[element] > 0)) throw new RangeError(`element ${element} has no positive cost`);
		}
	}
}

async function byProgram(
	part: number[][],
	costs: ArrayLike<number>,
	own: number[] | null,
	nodes: number,
): Promise<ProgramAnswer> {
	const solve = await loadProgramSolver();
	const found = solve(part, costs, nodes);
	const packing = packingBound(part, costs);
	const lowerBound = Math.max(packing, found?.lowerBound ?? packing);
	const meets = (chosen: number[]) => {
		const set = new Set(chosen);
		return part.every((elements) => elements.some((element) => set.has(element)));
	};
	if (found && meets(found.chosen)) return { ...found, lowerBound };
	return { chosen: own ?? greedyHittingSet(part, costs), lowerBound, proved: false };
}
