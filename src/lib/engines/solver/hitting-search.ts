import { holdersOf, independentParts, reduceSets } from './hitting-reductions.ts';

const ROUNDING = 1e-9;

export const costOf = (elements: Iterable<number>, costs: ArrayLike<number>) => {
	let cost = 0;
	for (const element of elements) cost += costs[element];
	return cost;
};

/** No hitting set is cheaper: disjoint sets each need an element of their own. */
export function packingBound(sets: readonly number[][], costs: ArrayLike<number>): number {
	const used = new Set<number>();
	let bound = 0;
	for (const set of [...sets].sort((a, b) => a.length - b.length)) {
		if (set.some((element) => used.has(element))) continue;
		for (const element of set) used.add(element);
		bound += Math.min(...set.map((element) => costs[element]));
	}
	return bound;
}

/** A hitting set, not always a cheapest: again and again the element that meets most sets for its cost. */
export function greedyHittingSet(sets: readonly number[][], costs: ArrayLike<number>): number[] {
	const chosen: number[] = [];
	let open = [...sets];
	while (open.length > 0) {
		let best = -1;
		let worth = -1;
		for (const [element, places] of holdersOf(open)) {
			if (places.length / costs[element] <= worth) continue;
			worth = places.length / costs[element];
			best = element;
		}
		chosen.push(best);
		open = open.filter((set) => !set.includes(best));
	}
	return chosen;
}

/**
 * Branch and bound: reduce, split into independent parts, branch on a shortest set. `steps` is counted
 * down at every node; once it is used up `exhausted` is set and the answer may not be the cheapest.
 */
export class HittingSearch {
	exhausted = false;

	constructor(
		private costs: ArrayLike<number>,
		private steps: number,
	) {}

	/** The cheapest hitting set that costs less than `limit`, or null when there is none. */
	below(sets: readonly (readonly number[])[], limit: number): number[] | null {
		if (this.steps-- <= 0) this.exhausted = true;
		if (this.exhausted || sets.some((set) => set.length === 0)) return null;
		const { forced, rest } = reduceSets(sets, this.costs);
		const chosen = [...forced];
		const parts = independentParts(rest).map((part) => ({
			part,
			bound: packingBound(part, this.costs),
		}));
		let left = limit - costOf(forced, this.costs);
		for (const { bound } of parts) left -= bound;
		if (left <= ROUNDING) return null;
		for (const { part, bound } of parts) {
			const answer = this.branch(part, left + bound);
			if (!answer) return null;
			left -= costOf(answer, this.costs) - bound;
			chosen.push(...answer);
		}
		return left > ROUNDING ? chosen : null;
	}

	private branch(part: number[][], limit: number): number[] | null {
		const holders = holdersOf(part);
		const worth = (element: number) => (holders.get(element)?.length ?? 0) / this.costs[element];
		const pivot = part.reduce((a, b) => (b.length < a.length ? b : a));
		const tried = new Set<number>();
		let best: number[] | null = null;
		for (const element of [...pivot].sort((a, b) => worth(b) - worth(a) || a - b)) {
			const open = part.filter((set) => !set.includes(element));
			const rest = open.map((set) => set.filter((other) => !tried.has(other)));
			const answer = this.below(rest, limit - this.costs[element]);
			tried.add(element);
			if (!answer) continue;
			best = [element, ...answer];
			limit = costOf(best, this.costs);
		}
		return best;
	}
}
