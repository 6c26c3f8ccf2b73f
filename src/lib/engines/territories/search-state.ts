import type { SearchTerms } from './search-terms.ts';

/**
 * An assignment under search with what follows from it: loads, members, territories outside tolerance,
 * cut borders and the cost of moves. Only `move` changes it; every figure is kept exact within rounding.
 */
export class SearchState {
	readonly terms: SearchTerms;
	readonly assignment: Int32Array;
	/** load of bound measure m in territory t: `loads[m * territories + t]` */
	readonly loads: Float64Array;
	/** units of each territory; the first `sizes[t]` entries count */
	readonly members: Int32Array[];
	readonly sizes: Int32Array;
	/** territories outside some tolerance: the first `outsideCount` entries */
	readonly outside: Int32Array;
	outsideCount = 0;
	/** joined pairs in two territories */
	cuts = 0;
	/** cost of all moves, in mean moves */
	cost = 0;
	private readonly place: Int32Array;
	private readonly outsidePlace: Int32Array;

	constructor(terms: SearchTerms, assignment: Int32Array) {
		const { units, territories, bound } = terms.prepared;
		this.terms = terms;
		this.assignment = assignment.slice();
		this.loads = new Float64Array(bound.length * territories);
		this.members = [];
		this.sizes = new Int32Array(territories);
		this.place = new Int32Array(units);
		this.outside = new Int32Array(territories);
		this.outsidePlace = new Int32Array(territories).fill(-1);
		for (let t = 0; t < territories; t++) this.members.push(new Int32Array(16));
		this.fill();
	}

	private fill(): void {
		const { prepared, cost } = this.terms;
		const { units, territories, graph, problem } = prepared;
		for (let unit = 0; unit < units; unit++) {
			const t = this.assignment[unit];
			this.join(unit, t);
			if (t !== problem.today[unit]) this.cost += cost[unit];
			for (let i = graph.offsets[unit]; i < graph.offsets[unit + 1]; i++) {
				const other = graph.targets[i];
				if (other > unit && this.assignment[other] !== t) this.cuts++;
			}
		}
		this.sumLoads();
		for (let t = 0; t < territories; t++) this.judge(t);
	}

	/** Adds the loads up afresh, so that rounding cannot pile up over millions of moves. */
	sumLoads(): void {
		const { units, territories, bound, loads } = this.terms.prepared;
		this.loads.fill(0);
		for (let m = 0; m < bound.length; m++) {
			for (let unit = 0; unit < units; unit++) {
				this.loads[m * territories + this.assignment[unit]] += loads[m * units + unit];
			}
		}
	}

	private join(unit: number, t: number): void {
		let list = this.members[t];
		const size = this.sizes[t]++;
		if (size === list.length) {
			list = new Int32Array(2 * size);
			list.set(this.members[t]);
			this.members[t] = list;
		}
		list[size] = unit;
		this.place[unit] = size;
	}

	private leave(unit: number, t: number): void {
		const list = this.members[t];
		const last = list[--this.sizes[t]];
		list[this.place[unit]] = last;
		this.place[last] = this.place[unit];
	}

	/** 1 above, -1 below, 0 inside the tolerances of territory t (above wins where measures differ). */
	side(t: number): number {
		const { bound, territories, least, greatest, stays } = this.terms.prepared;
		if (!stays[t]) return 0;
		let side = 0;
		for (let m = 0, at = t; m < bound.length; m++, at += territories) {
			if (this.loads[at] > greatest[at]) return 1;
			if (this.loads[at] < least[at]) side = -1;
		}
		return side;
	}

	private judge(t: number): void {
		const isOutside = this.side(t) !== 0;
		const at = this.outsidePlace[t];
		if (isOutside === at >= 0) return;
		if (isOutside) {
			this.outsidePlace[t] = this.outsideCount;
			this.outside[this.outsideCount++] = t;
			return;
		}
		const last = this.outside[--this.outsideCount];
		this.outside[at] = last;
		this.outsidePlace[last] = at;
		this.outsidePlace[t] = -1;
	}

	/** Moves `unit` to territory `to`; whether that is allowed is for the caller to know. */
	move(unit: number, to: number): void {
		const { prepared, cost } = this.terms;
		const { units, territories, bound, loads, problem } = prepared;
		const from = this.assignment[unit];
		this.cuts += this.cutChange(unit, from, to);
		this.assignment[unit] = to;
		this.leave(unit, from);
		this.join(unit, to);
		for (let m = 0; m < bound.length; m++) {
			const load = loads[m * units + unit];
			this.loads[m * territories + from] -= load;
			this.loads[m * territories + to] += load;
		}
		const today = problem.today[unit];
		if (from === today) this.cost += cost[unit];
		else if (to === today) this.cost -= cost[unit];
		this.judge(from);
		this.judge(to);
	}

	/** Cut borders more (or, below 0, fewer) if `unit` went from its territory `from` to `to`. */
	cutChange(unit: number, from: number, to: number): number {
		const { offsets, targets } = this.terms.prepared.graph;
		const { assignment } = this;
		let change = 0;
		for (let i = offsets[unit], end = offsets[unit + 1]; i < end; i++) {
			const t = assignment[targets[i]];
			if (t === from) change++;
			else if (t === to) change--;
		}
		return change;
	}

	/** Pairs to be kept apart that are not. */
	conflicts(): number {
		const { apartPairs } = this.terms;
		let count = 0;
		for (let i = 0; i < apartPairs.length; i += 2) {
			if (this.assignment[apartPairs[i]] === this.assignment[apartPairs[i + 1]]) count++;
		}
		return count;
	}
}
