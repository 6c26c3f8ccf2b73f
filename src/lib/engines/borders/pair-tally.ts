import { GrowingFloats, GrowingInts } from '../geometry/growing.ts';
import type { BorderList } from './border-list.ts';

/**
 * Pairs being collected: metres add up, the place kept is that of the longest stretch. All is in flat
 * arrays, found through a table of slots with open addressing, for a large map has 400,000 pairs.
 */
export class PairTally {
	/** place of a pair in the lists, from 1; 0 for none */
	private slots = new Int32Array(4096);
	private codes = new GrowingFloats();
	private kinds = new GrowingInts();
	private metres = new GrowingFloats();
	private longest = new GrowingFloats();
	private at = new GrowingFloats();

	constructor(private regions: number) {}

	has(a: number, b: number): boolean {
		return this.slots[this.slotOf(this.code(a, b))] > 0;
	}

	add(a: number, b: number, kind: number, metres: number, x: number, y: number): void {
		const code = this.code(a, b);
		const slot = this.slotOf(code);
		const i = this.slots[slot] - 1;
		if (i < 0) {
			this.codes.push(code);
			this.kinds.push(kind);
			this.metres.push(metres);
			this.longest.push(metres);
			this.at.push2(x, y);
			this.slots[slot] = this.codes.length;
			if (2 * this.codes.length > this.slots.length) this.widen();
			return;
		}
		this.metres.items[i] += metres;
		if (metres <= this.longest.items[i]) return;
		this.longest.items[i] = metres;
		this.at.items[2 * i] = x;
		this.at.items[2 * i + 1] = y;
	}

	list(): BorderList {
		const ordered = this.codes.taken().slice().sort();
		const list = emptyList(ordered.length);
		for (let k = 0; k < ordered.length; k++) {
			const i = this.slots[this.slotOf(ordered[k])] - 1;
			list.a[k] = Math.floor(ordered[k] / this.regions);
			list.b[k] = ordered[k] % this.regions;
			list.kind[k] = this.kinds.items[i];
			list.metres[k] = this.metres.items[i];
			list.at[2 * k] = this.at.items[2 * i];
			list.at[2 * k + 1] = this.at.items[2 * i + 1];
		}
		return list;
	}

	private code(a: number, b: number): number {
		return a < b ? a * this.regions + b : b * this.regions + a;
	}

	/** Where a pair is, or the free slot for it. */
	private slotOf(code: number): number {
		const { slots, codes } = this;
		const mixed = Math.imul(code | 0, 0x9e3779b1) ^ Math.imul(code / 2 ** 32, 0x85ebca6b);
		let slot = (mixed ^ (mixed >>> 15)) & (slots.length - 1);
		while (slots[slot] > 0 && codes.items[slots[slot] - 1] !== code) {
			slot = (slot + 1) & (slots.length - 1);
		}
		return slot;
	}

	private widen(): void {
		this.slots = new Int32Array(2 * this.slots.length);
		for (let i = 0; i < this.codes.length; i++)
			this.slots[this.slotOf(this.codes.items[i])] = i + 1;
	}
}

export function emptyList(count: number): BorderList {
	return {
		a: new Uint32Array(count),
		b: new Uint32Array(count),
		kind: new Uint8Array(count),
		metres: new Float64Array(count),
		at: new Float64Array(2 * count),
	};
}
