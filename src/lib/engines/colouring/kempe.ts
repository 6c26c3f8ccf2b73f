import { setInk, FreeInks, type Board } from './board.ts';
import { Chains } from './chains.ts';
import { Random } from './random.ts';

export interface KempeOptions {
	seed: number;
	/** random chain exchanges tried at one impasse */
	walk: number;
	/** chain vertices visited in all before giving up */
	steps: number;
	/** exchanges that set an ink free are not even tried; for tests of what follows */
	chains?: boolean;
	/** asked to ink a vertex that no exchange could; false gives the run up */
	stuck?: (board: Board, v: number) => boolean;
	cancelled?: () => boolean;
}

export interface KempeStats {
	/** vertices that needed a walk, and the longest */
	walks: number;
	longestWalk: number;
	/** vertices that needed `stuck` */
	stuck: number;
	finished: boolean;
}

/**
 * Inks every vertex of the board in the reverse of the given order (smallest-last: see graph), each
 * with its least used free ink; where none is free, Kempe exchanges make room, then random exchanges
 * and another try, then `stuck`. Stops at the first vertex that stays without ink.
 */
export function kempe(board: Board, order: Uint32Array, options: KempeOptions): KempeStats {
	const run = new KempeRun(board, options);
	const stats = run.stats;
	for (let i = order.length - 1; i >= 0; i--) {
		if (board.ink[order[i]] >= 0) continue;
		if ((i & 4095) === 0 && options.cancelled?.()) return stats;
		if (!run.ink(order[i])) return stats;
	}
	stats.finished = true;
	return stats;
}

/** The largest chain a random exchange may turn over; longer ones cost more than they shake up. */
const longestFlip = 5_000;

class KempeRun {
	readonly stats: KempeStats = { walks: 0, longestWalk: 0, stuck: 0, finished: false };
	private readonly freeInks: FreeInks;
	private readonly random: Random;
	private chains: Chains | null = null;

	constructor(
		private readonly board: Board,
		private readonly options: KempeOptions,
	) {
		this.freeInks = new FreeInks(board);
		this.random = new Random(options.seed);
	}

	ink(v: number): boolean {
		const free = this.freeInks.leastUsed(v);
		if (free >= 0) {
			setInk(this.board, v, free);
			return true;
		}
		if (this.options.chains !== false && (this.byChain(v) || this.byWalk(v))) return true;
		this.stats.stuck++;
		return this.options.stuck?.(this.board, v) ?? false;
	}

	private byChain(v: number): boolean {
		const chains = (this.chains ??= new Chains(this.board));
		for (let d = 1; d < this.board.inks; d++) {
			for (let c = 0; c < d; c++) {
				if (chains.steps > this.options.steps) return false;
				const free = chains.free(v, c, d);
				if (free < 0) continue;
				setInk(this.board, v, free);
				return true;
			}
		}
		return false;
	}

	private byWalk(v: number): boolean {
		const { offsets, targets } = this.board.graph;
		const degree = offsets[v + 1] - offsets[v];
		const chains = this.chains as Chains;
		if (this.options.walk > 0) this.stats.walks++;
		for (let step = 1; step <= this.options.walk && chains.steps <= this.options.steps; step++) {
			const w = targets[offsets[v] + this.random.below(degree)];
			const d = this.random.below(this.board.inks);
			if (this.board.ink[w] < 0 || d === this.board.ink[w]) continue;
			if (!chains.flip(w, d, longestFlip)) continue;
			this.stats.longestWalk = Math.max(this.stats.longestWalk, step);
			const free = this.freeInks.leastUsed(v);
			if (free >= 0) {
				setInk(this.board, v, free);
				return true;
			}
			if (this.byChain(v)) return true;
		}
		return false;
	}
}
