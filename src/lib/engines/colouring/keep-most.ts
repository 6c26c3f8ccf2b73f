import type { Sat } from '../solver/sat.ts';
import { totalizer } from './totalizer.ts';

export type Kept = { status: 'optimal'; cost: number } | { status: 'open'; lowerBound: number };

/** Conflicts for one try to leave a literal out of a core. */
const trimConflicts = 200;

/**
 * Breaks as little weight of the wishes as the clauses in `sat` allow. Goes on where it stopped: wishes
 * and clauses may be added between two searches, as neither makes what was found to be broken less.
 *
 * Source: core-guided search with soft cardinality constraints: B. Andres et al., Unsatisfiability-based
 * optimization in clasp, ICLP 2012; A. Morgado, C. Dodaro, J. Marques-Silva, CP 2014.
 */
export class KeepMost {
	/** what is still to be kept; literals of totalizers among them */
	private readonly weights = new Map<number, number>();
	private readonly next = new Map<number, number>();
	private lowerBound = 0;

	constructor(private readonly sat: Sat) {}

	wish(literal: number, weight: number): void {
		this.weights.set(literal, (this.weights.get(literal) ?? 0) + weight);
	}

	/**
	 * 'optimal': the assignment is in `sat`. 'open' when the conflicts ran out: breaking less than
	 * `lowerBound` is impossible all the same.
	 */
	search(budget: { conflicts: number; cancelled?: () => boolean }): Kept {
		const { sat } = this;
		const last = sat.conflicts + budget.conflicts;
		for (;;) {
			const conflicts = last - sat.conflicts;
			if (conflicts <= 0) return { status: 'open', lowerBound: this.lowerBound };
			const limits = { conflicts, cancelled: budget.cancelled };
			const answer = sat.solve([...this.weights.keys()], limits);
			if (answer === 'sat') return { status: 'optimal', cost: this.lowerBound };
			const core = answer === 'unsat' ? this.trimmed(sat.core()) : [];
			if (core.length === 0) return { status: 'open', lowerBound: this.lowerBound };
			this.lowerBound += this.relax(core);
		}
	}

	/** Leaves out what the core can spare. */
	private trimmed(core: number[]): number[] {
		for (let i = 0; i < core.length && core.length > 1;) {
			const rest = core.filter((_, j) => j !== i);
			if (this.sat.solve(rest, { conflicts: trimConflicts }) !== 'unsat') i++;
			else core = this.sat.core();
		}
		return core;
	}

	/** Takes the least weight off a core and allows one of its wishes to be broken; that weight. */
	private relax(core: number[]): number {
		const { weights, next } = this;
		const least = Math.min(...core.map((literal) => weights.get(literal) as number));
		for (const literal of core) {
			const left = (weights.get(literal) as number) - least;
			if (left > 0) weights.set(literal, left);
			else weights.delete(literal);
			const after = next.get(literal);
			if (after !== undefined) this.wish(after, least);
		}
		if (core.length > 1) {
			const broken = totalizer(
				this.sat,
				core.map((literal) => -literal),
			);
			for (let i = 1; i + 1 < broken.length; i++) next.set(-broken[i], -broken[i + 1]);
			this.wish(-broken[1], least);
		}
		return least;
	}
}
