/**
 * Whole numbers 0..below-1 in an order fixed by the seed.
 *
 * Source: G. Marsaglia, Xorshift RNGs, J. Stat. Software 8 (2003), 32-bit triple 13, 17, 5.
 */
export class Random {
	private state: number;

	constructor(seed: number) {
		this.state = Math.imul(seed | 0, 0x9e3779b1) ^ 0x2545f491 || 1;
		for (let i = 0; i < 4; i++) this.next();
	}

	private next(): number {
		let x = this.state;
		x ^= x << 13;
		x ^= x >>> 17;
		x ^= x << 5;
		this.state = x;
		return x >>> 0;
	}

	below(bound: number): number {
		return Math.floor((this.next() / 4294967296) * bound);
	}
}
