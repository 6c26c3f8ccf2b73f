/**
 * Random numbers for the searches, fixed by the seed and free of allocation.
 *
 * Source: G. Marsaglia, Xorshift RNGs, J. Stat. Software 8 (2003), 32-bit triple 13, 17, 5.
 */
export class Dice {
	private readonly state = new Uint32Array(1);

	constructor(seed: number) {
		this.state[0] = (Math.imul(seed | 0, 0x9e3779b1) ^ 0x2545f491) >>> 0 || 1;
		for (let i = 0; i < 4; i++) this.next();
	}

	/** A whole number from 1 to 2^32 - 1. */
	next(): number {
		let x = this.state[0];
		x ^= x << 13;
		x ^= x >>> 17;
		x ^= x << 5;
		this.state[0] = x;
		return x >>> 0;
	}

	/** A whole number from 0 to `bound` - 1. */
	below(bound: number): number {
		return (this.next() * 2.3283064365386963e-10 * bound) | 0;
	}

	/** True in so many of 65,536 throws. */
	chance(share: number): boolean {
		return this.next() >>> 16 < share;
	}
}

/** -ln of evenly spread numbers: what a rise in energy, in temperatures, may be at a random draw. */
export const rises = Float64Array.from({ length: 4096 }, (_, i) => -Math.log((i + 0.5) / 4096));
