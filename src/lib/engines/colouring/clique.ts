import { adjacent } from '../graph/adjacent.ts';
import type { RegionGraph } from '../graph/region-graph.ts';

/**
 * A largest clique, or the largest found before `enough` or the end of the steps. `exact` says that no
 * larger one exists. Each clique has a vertex that the smallest-last order takes first, so only the
 * neighbours after it are searched, largest possible first, cut by a colouring bound.
 *
 * Source: the ordering of D. Eppstein, M. Löffler, D. Strash, ISAAC 2010; the bound by greedy
 * colouring of E. Tomita, T. Seki, DMTCS 2003.
 */
export function largestClique(
	graph: RegionGraph,
	order: Uint32Array,
	{ enough = Infinity, steps = Infinity }: { enough?: number; steps?: number } = {},
): { clique: number[]; exact: boolean } {
	const search = new CliqueSearch(graph, enough, steps);
	const place = new Uint32Array(graph.count);
	for (let i = 0; i < order.length; i++) place[order[i]] = i;
	for (let i = order.length - 1; i >= 0 && !search.over; i--) search.from(order[i], place);
	return { clique: search.best, exact: !search.over };
}

class CliqueSearch {
	best: number[] = [];
	over = false;
	private readonly current: number[] = [];

	constructor(
		private readonly graph: RegionGraph,
		private readonly enough: number,
		private steps: number,
	) {}

	from(v: number, place: Uint32Array): void {
		const { offsets, targets } = this.graph;
		const candidates: number[] = [];
		for (let i = offsets[v]; i < offsets[v + 1]; i++) {
			if (place[targets[i]] > place[v]) candidates.push(targets[i]);
		}
		if (candidates.length < this.best.length) return;
		this.current.length = 0;
		this.current.push(v);
		this.extend(candidates);
	}

	private extend(candidates: number[]): void {
		if (candidates.length === 0) return this.keep();
		const { ordered, bound } = this.classes(candidates);
		for (let i = ordered.length - 1; i >= 0 && !this.over; i--) {
			if (this.current.length + bound[i] <= this.best.length) return;
			this.current.push(ordered[i]);
			const rest: number[] = [];
			for (let j = 0; j < i; j++) {
				if (adjacent(this.graph, ordered[i], ordered[j])) rest.push(ordered[j]);
			}
			this.steps -= i + 1;
			if (this.steps < 0) this.over = true;
			this.extend(rest);
			this.current.pop();
		}
	}

	private keep(): void {
		if (this.current.length <= this.best.length) return;
		this.best = this.current.slice();
		if (this.best.length >= this.enough) this.over = true;
	}

	/** Greedy colour classes: a clique within the first i of `ordered` has at most `bound[i]`. */
	private classes(candidates: number[]): { ordered: number[]; bound: number[] } {
		const classes: number[][] = [];
		for (const v of candidates) {
			const fit = classes.find((members) => members.every((w) => !adjacent(this.graph, v, w)));
			this.steps -= candidates.length;
			if (fit) fit.push(v);
			else classes.push([v]);
		}
		const ordered: number[] = [];
		const bound: number[] = [];
		classes.forEach((members, index) => {
			for (const v of members) {
				ordered.push(v);
				bound.push(index + 1);
			}
		});
		return { ordered, bound };
	}
}
