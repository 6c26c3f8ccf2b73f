import type { RegionGraph } from '../graph/region-graph.ts';
import { banned, type Bans } from './bans.ts';

/** A colouring in the making: proper at every moment, with -1 where a vertex has no ink yet. */
export interface Board {
	graph: RegionGraph;
	inks: number;
	ink: Int32Array;
	/** how many vertices have each ink */
	use: Uint32Array;
	/** locked vertices, -1 for free */
	fixed: Int32Array | null;
	bans: Bans | null;
}

/** A board with only the locked vertices inked. Locks must not clash. */
export function newBoard(
	graph: RegionGraph,
	inks: number,
	fixed: Int32Array | null = null,
	bans: Bans | null = null,
): Board {
	const ink = fixed ? fixed.slice() : new Int32Array(graph.count).fill(-1);
	const use = new Uint32Array(inks);
	if (fixed) for (let v = 0; v < fixed.length; v++) if (fixed[v] >= 0) use[fixed[v]]++;
	return { graph, inks, ink, use, fixed, bans };
}

export function mayTake(board: Board, v: number, ink: number): boolean {
	if (board.fixed !== null && board.fixed[v] >= 0) return board.fixed[v] === ink;
	return board.bans === null || !banned(board.bans, v, ink);
}

export function setInk(board: Board, v: number, ink: number): void {
	const before = board.ink[v];
	if (before >= 0) board.use[before]--;
	board.ink[v] = ink;
	if (ink >= 0) board.use[ink]++;
}

/** The inks no neighbour of a vertex has; one scratch list serves a whole run. */
export class FreeInks {
	private readonly taken: Float64Array;
	private stamp = 0;

	constructor(private readonly board: Board) {
		this.taken = new Float64Array(board.inks);
	}

	/** The least used ink free at `v`, or -1. */
	leastUsed(v: number): number {
		const { graph, ink, use, inks, bans } = this.board;
		const { offsets, targets } = graph;
		const stamp = ++this.stamp;
		for (let i = offsets[v]; i < offsets[v + 1]; i++) {
			const c = ink[targets[i]];
			if (c >= 0) this.taken[c] = stamp;
		}
		let best = -1;
		for (let c = 0; c < inks; c++) {
			if (this.taken[c] === stamp || (best >= 0 && use[c] >= use[best])) continue;
			if (bans !== null && banned(bans, v, c)) continue;
			best = c;
		}
		return best;
	}
}
