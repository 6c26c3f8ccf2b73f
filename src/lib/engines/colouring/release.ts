import { greedyHittingSet } from '../solver/hitting-search.ts';
import { minimumHittingSet } from '../solver/integer.ts';
import type { Case } from './explain-case.ts';
import type { Purse } from './explain-purse.ts';
import { shrink, type Clash } from './explain-shrink.ts';
import type { Whole } from './explain-whole.ts';

export interface CheapestRelease {
	/** demands to drop */
	demands: number[];
	cost: number;
	lowerBound: number;
	proved: boolean;
	/** what was found to clash on the way, smallest first */
	clashes: Clash[];
}

const ROUNDING = 1e-9;
/** choices by rule of thumb tried after each exact one */
const QUICK_CHOICES = 3;
/** of the integer program for a choice: few while new clashes still come, then so many */
const NODES = [1, 100];

/**
 * The cheapest demands to drop so that the rest can be met, where dropping `unmet` is known to work: an
 * assignment leaves just them unmet. What is dropped is always such a list, so that a reserved ink that
 * went with a lock is not had without it. `rows` are the sets that may be handed to the integer program,
 * counted at each choice.
 *
 * Method: implicit hitting sets (Chandrasekaran et al. 2013; Davies and Bacchus 2011). A cheapest
 * choice that meets every clash known is dropped; if the rest still clashes, the new clash is shrunk and
 * set aside, again and again, and all of them are added. What such a choice costs is a lower bound;
 * what an assignment found on the way leaves unmet is an upper one.
 */
export async function cheapestRelease(
	of: Case,
	whole: Whole,
	purse: Purse,
	{ rows, ...options }: ReleaseOptions,
): Promise<CheapestRelease> {
	const search = new ReleaseSearch(of, whole, purse, options);
	while (search.rows < rows && !search.closed && !purse.empty) {
		if (!(await search.round())) break;
	}
	if (!search.closed) search.improve();
	return search.result();
}

export type ReleaseSoFar = Pick<CheapestRelease, 'demands' | 'cost' | 'lowerBound'>;

interface ReleaseOptions {
	rows: number;
	seed: number;
	unmet: number[];
	/** told whenever the best release or the bound is better than before */
	found?: (soFar: ReleaseSoFar) => void;
}

class ReleaseSearch {
	/** sets handed to the integer program so far */
	rows = 0;
	private best: number[];
	private bestCost: number;
	private lowerBound = 0;
	private readonly clashes: Clash[];
	private readonly costs: Float64Array;
	/** which of `NODES` the next choice gets */
	private depth = 0;

	constructor(
		private of: Case,
		private whole: Whole,
		private purse: Purse,
		private options: Omit<ReleaseOptions, 'rows'>,
	) {
		this.clashes = whole.immediate.map((demands) => ({ demands, vertices: [] }));
		this.costs = Float64Array.from(of.demands, (demand) => demand.cost);
		this.best = options.unmet;
		this.bestCost = this.costOf(this.best);
	}

	get closed(): boolean {
		return this.lowerBound >= this.bestCost * (1 - ROUNDING);
	}

	/** One exact choice and the clashes it leaves; false when nothing more can be learnt. */
	async round(): Promise<boolean> {
		const nodes = NODES[this.depth];
		const choice = await minimumHittingSet(this.sets(), this.costs, { nodes });
		this.raise(choice.lowerBound);
		this.rows += choice.rows;
		const before = this.clashes.length;
		if (this.closed) return false;
		this.gather(choice.chosen, true);
		for (let i = 0; i < QUICK_CHOICES && !this.closed; i++) {
			if (!this.gather(greedyHittingSet(this.sets(), this.costs), false)) break;
		}
		if (this.clashes.length > before) return true;
		if (choice.proved || this.depth + 1 === NODES.length) return false;
		this.depth++;
		return true;
	}

	private raise(lowerBound: number): void {
		if (lowerBound <= this.lowerBound) return;
		this.lowerBound = lowerBound;
		this.tell();
	}

	private tell(): void {
		const { best: demands, bestCost: cost, lowerBound } = this;
		this.options.found?.({ demands, cost, lowerBound: Math.min(lowerBound, cost) });
	}

	private sets(): number[][] {
		return this.clashes.map((clash) => clash.demands);
	}

	/**
	 * Gathers clashes of what is held when the choice is dropped, and drops more until the rest can be
	 * met: every demand of a clash when they are to lie `apart`, else the one that most clashes share.
	 * Whether there were any.
	 */
	private gather(choice: number[], apart: boolean): boolean {
		const held = new Set(this.of.demands.keys());
		for (const d of choice) held.delete(d);
		const before = this.clashes.length;
		while (!this.closed) {
			const answer = this.ask(held);
			if (answer === 'sat') this.offer(held);
			if (answer !== 'unsat') break;
			const failed = this.whole.failedDemands();
			const clash = shrink(this.of, failed, this.purse, this.options.seed);
			this.clashes.push(clash ?? { demands: failed, vertices: [] });
			const { demands } = this.clashes[this.clashes.length - 1];
			for (const d of apart ? demands : [this.worthiest(demands)]) held.delete(d);
		}
		return this.clashes.length > before;
	}

	/** The demand that takes part in most clashes for its cost. */
	private worthiest(demands: number[]): number {
		const shares = new Map(demands.map((d) => [d, 0]));
		for (const clash of this.clashes) {
			for (const d of clash.demands) if (shares.has(d)) shares.set(d, (shares.get(d) ?? 0) + 1);
		}
		const worth = (d: number) => (shares.get(d) ?? 0) / this.costs[d];
		return demands.reduce((a, b) => (worth(b) > worth(a) ? b : a));
	}

	/** Takes demands back one by one where that works, dearest first. */
	improve(): void {
		const dearest = [...this.best].sort((a, b) => this.costs[b] - this.costs[a]);
		for (const d of dearest) {
			if (this.closed || this.purse.empty) return;
			if (!this.best.includes(d)) continue;
			const held = new Set(this.of.demands.keys());
			for (const dropped of this.best) if (dropped !== d) held.delete(dropped);
			if (this.ask(held) === 'sat') this.offer(held);
		}
	}

	result(): CheapestRelease {
		const proved = this.closed;
		const clashes = this.clashes.sort((a, b) => a.demands.length - b.demands.length);
		const lowerBound = proved ? this.bestCost : this.lowerBound;
		return { demands: this.best, cost: this.bestCost, lowerBound, proved, clashes };
	}

	private ask(held: Set<number>) {
		return this.whole.ask(held, this.purse);
	}

	/** What the assignment just found leaves unmet is a release. */
	private offer(held: Set<number>): void {
		const unmet: number[] = [];
		for (let d = 0; d < this.of.demands.length; d++) {
			if (!held.has(d) && !this.whole.meets(d)) unmet.push(d);
		}
		const cost = this.costOf(unmet);
		if (cost >= this.bestCost) return;
		this.best = unmet;
		this.bestCost = cost;
		this.tell();
	}

	private costOf(demands: number[]): number {
		return demands.reduce((sum, d) => sum + this.costs[d], 0);
	}
}
