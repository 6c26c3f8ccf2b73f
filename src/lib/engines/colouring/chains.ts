import { mayTake, type Board } from './board.ts';

/**
 * Kempe chains: the connected part of two inks around some vertices, and its exchange of the two.
 * Locked vertices and forbidden inks hold a chain fast. Counts its steps so that callers can stop.
 *
 * Source: A. B. Kempe, On the geographical problem of the four colours, Am. J. Math. 2 (1879);
 * two searches side by side, so that the cost is that of the smaller chain, are our own.
 */
export class Chains {
	/** vertices visited so far */
	steps = 0;
	private readonly mark: Float64Array;
	private readonly queues: [Uint32Array, Uint32Array];
	private readonly head: [number, number] = [0, 0];
	private readonly tail: [number, number] = [0, 0];
	private stamp = 0;

	constructor(private readonly board: Board) {
		const { count } = board.graph;
		this.mark = new Float64Array(count);
		this.queues = [new Uint32Array(count), new Uint32Array(count)];
	}

	/** Tries to rid the neighbours of `v` of ink c or of ink d; the ink set free, or -1. */
	free(v: number, c: number, d: number): number {
		const alive: [boolean, boolean] = [mayTake(this.board, v, c), mayTake(this.board, v, d)];
		this.begin();
		this.seed(v, c, d, alive);
		while (alive[0] || alive[1]) {
			for (const side of [0, 1] as const) {
				if (!alive[side]) continue;
				if (this.head[side] === this.tail[side]) {
					this.exchange(side, c, d);
					return side === 0 ? c : d;
				}
				const met = this.grow(side, c, d);
				if (met === 'other') return -1;
				if (met === 'held') alive[side] = false;
			}
		}
		return -1;
	}

	/** Exchanges the inks of the chain through `v` and ink `d` unless it is held or above `limit`. */
	flip(v: number, d: number, limit: number): boolean {
		const c = this.board.ink[v];
		if (this.chain(v, d, limit) === null) return false;
		this.exchange(0, c, d);
		return true;
	}

	/** The chain through `v` and ink `d`, valid until the next call; null when held or above `limit`. */
	chain(v: number, d: number, limit: number): Uint32Array | null {
		const c = this.board.ink[v];
		this.begin();
		if (!this.push(0, v, c, d)) return null;
		while (this.head[0] < this.tail[0]) {
			if (this.tail[0] > limit || this.grow(0, c, d) === 'held') return null;
		}
		return this.queues[0].subarray(0, this.tail[0]);
	}

	/** Exchanges the inks of the chain asked for last. */
	turn(c: number, d: number): void {
		this.exchange(0, c, d);
	}

	private begin(): void {
		this.stamp += 2;
		this.head.fill(0);
		this.tail.fill(0);
	}

	private seed(v: number, c: number, d: number, alive: [boolean, boolean]): void {
		const { graph, ink } = this.board;
		for (let i = graph.offsets[v]; i < graph.offsets[v + 1]; i++) {
			const w = graph.targets[i];
			if (ink[w] === c && !this.push(0, w, c, d)) alive[0] = false;
			else if (ink[w] === d && !this.push(1, w, c, d)) alive[1] = false;
		}
	}

	/** Takes in one vertex; false when it cannot have the other ink. */
	private push(side: 0 | 1, w: number, c: number, d: number): boolean {
		this.steps++;
		this.mark[w] = this.stamp + side;
		this.queues[side][this.tail[side]++] = w;
		return mayTake(this.board, w, this.board.ink[w] === c ? d : c);
	}

	private grow(side: 0 | 1, c: number, d: number): 'grown' | 'held' | 'other' {
		const { offsets, targets } = this.board.graph;
		const { ink } = this.board;
		const { mark } = this;
		const mine = this.stamp + side;
		const other = this.stamp + 1 - side;
		const v = this.queues[side][this.head[side]++];
		const wanted = ink[v] === c ? d : c;
		for (let i = offsets[v]; i < offsets[v + 1]; i++) {
			const w = targets[i];
			if (ink[w] !== wanted || mark[w] === mine) continue;
			if (mark[w] === other) return 'other';
			if (!this.push(side, w, c, d)) return 'held';
		}
		return 'grown';
	}

	private exchange(side: 0 | 1, c: number, d: number): void {
		const { ink, use } = this.board;
		const queue = this.queues[side];
		let toD = 0;
		for (let i = 0; i < this.tail[side]; i++) {
			const w = queue[i];
			if (ink[w] === c) {
				ink[w] = d;
				toD++;
			} else {
				ink[w] = c;
				toD--;
			}
		}
		use[c] -= toD;
		use[d] += toD;
	}
}
