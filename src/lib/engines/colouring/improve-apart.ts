import type { Aim } from './improve-aim.ts';
import type { Ground } from './improve-ground.ts';

/**
 * Same ink far apart: how many times two neighbours of one region share an ink. Regions of one ink never
 * touch, so those with a neighbour in common are the nearest there can be. The bound spreads the
 * neighbours of each region as evenly as can be over the inks other than its own.
 */
export class ApartAim implements Aim {
	readonly kind = 'same-ink-apart';
	readonly scales = 1;
	readonly descends = false;
	readonly bound: number;
	value = 0;
	/** neighbours of place p with ink c, at p * inks + c */
	private readonly around: Uint32Array;
	private weighed: { chain: Uint32Array; c: number; d: number; value: number } | null = null;

	constructor(private readonly ground: Ground) {
		const { borders, board } = ground;
		this.around = new Uint32Array(borders.count * board.inks);
		let bound = 0;
		for (let p = 0; p < borders.count; p++) {
			const degree = borders.offsets[p + 1] - borders.offsets[p];
			bound += pairsWhenSpread(degree, Math.max(1, board.inks - 1));
		}
		this.bound = bound;
		this.read();
	}

	get enough(): number {
		return this.bound;
	}

	read(): void {
		const { vertexAt, board, borders } = this.ground;
		const { offsets, targets } = borders;
		this.around.fill(0);
		this.value = 0;
		for (let p = 0; p < borders.count; p++) {
			for (let e = offsets[p]; e < offsets[p + 1]; e++) {
				this.value += this.around[p * board.inks + board.ink[vertexAt[targets[e]]]]++;
			}
		}
	}

	/** Turns the chain over in the counts; `forget` turns it back. */
	after(chain: Uint32Array, c: number, d: number): number {
		const value = this.value + this.turned(chain, c, d, false);
		this.weighed = { chain, c, d, value };
		return value;
	}

	keep(): void {
		if (this.weighed) this.value = this.weighed.value;
		this.weighed = null;
	}

	forget(): void {
		if (this.weighed) this.turned(this.weighed.chain, this.weighed.c, this.weighed.d, true);
		this.weighed = null;
	}

	private turned(chain: Uint32Array, c: number, d: number, back: boolean): number {
		const { first, board, borders } = this.ground;
		const { offsets, targets } = borders;
		const { ink, inks } = board;
		const { around } = this;
		let change = 0;
		for (const v of chain) {
			const now = ink[v];
			const other = now === c ? d : c;
			const [from, to] = back ? [other, now] : [now, other];
			for (let e = offsets[first[v]]; e < offsets[first[v + 1]]; e++) {
				const row = targets[e] * inks;
				change -= --around[row + from];
				change += around[row + to]++;
			}
		}
		return change;
	}
}

/** Pairs that share an ink when so many regions are spread evenly over so many inks. */
function pairsWhenSpread(regions: number, inks: number): number {
	const low = Math.floor(regions / inks);
	const more = regions - low * inks;
	return (inks * low * (low - 1)) / 2 + more * low;
}
