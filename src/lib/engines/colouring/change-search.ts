import { Sat } from '../solver/sat.ts';
import { mayTake, type Board } from './board.ts';
import { keptAt, type Wishes } from './changes.ts';
import { KeepMost, type Kept } from './keep-most.ts';

/**
 * The inks of some vertices as clauses, and how few of their wishes have to be broken. Vertices may be
 * taken in later: what was learnt of the earlier ones stays.
 */
export class ChangeSearch {
	private readonly sat = new Sat();
	private readonly most = new KeepMost(this.sat);
	/** the variable of ink 0 of each vertex; those of the other inks follow */
	private readonly first = new Map<number, number>();

	constructor(
		private readonly board: Board,
		private readonly wishes: Wishes,
	) {}

	/**
	 * Takes in the vertices that are new, with their borders to all that are in; `taken` are inks that
	 * those outside have beside a vertex. False when a vertex is left without any ink.
	 */
	take(vertices: Iterable<number>, taken?: (v: number) => ReadonlySet<number>): boolean {
		for (const v of vertices) {
			if (this.first.has(v)) continue;
			if (!this.enter(v, taken?.(v)) || !this.enterBorders(v)) return false;
		}
		return true;
	}

	search(limits: { conflicts: number; cancelled?: () => boolean }): Kept {
		return this.most.search(limits);
	}

	/** The old ink of a vertex if it is one of those set true, else the lowest of them. */
	inkOf(v: number): number {
		const first = this.first.get(v) as number;
		const old = this.wishes.old[v];
		if (old >= 0 && this.sat.value(first + old)) return old;
		let ink = 0;
		while (!this.sat.value(first + ink)) ink++;
		return ink;
	}

	private enter(v: number, taken?: ReadonlySet<number>): boolean {
		const { sat, board, wishes } = this;
		const inks = Array.from({ length: board.inks }, () => sat.newVariable());
		this.first.set(v, inks[0]);
		const may = (ink: number) => mayTake(board, v, ink) && !taken?.has(ink);
		for (let c = 0; c < inks.length; c++) if (!may(c) && !sat.addClause([-inks[c]])) return false;
		if (wishes.kept && !this.oneInk(inks)) return false;
		if (wishes.old[v] >= 0) sat.setPhase(inks[wishes.old[v]], true);
		for (const [ink, regions] of keptAt(wishes, v)) this.most.wish(inks[ink], regions);
		return sat.addClause(inks.filter((_, c) => may(c)));
	}

	/** Where the regions of one vertex wish for several inks, it must not count as having them all. */
	private oneInk(inks: number[]): boolean {
		return inks.every((one, c) =>
			inks.slice(0, c).every((other) => this.sat.addClause([-one, -other])),
		);
	}

	private enterBorders(v: number): boolean {
		const { offsets, targets } = this.board.graph;
		const first = this.first.get(v) as number;
		for (let e = offsets[v]; e < offsets[v + 1]; e++) {
			const other = this.first.get(targets[e]);
			if (other === undefined || targets[e] === v) continue;
			for (let c = 0; c < this.board.inks; c++) {
				if (!this.sat.addClause([-(first + c), -(other + c)])) return false;
			}
		}
		return true;
	}
}
