import type { Aim } from './improve-aim.ts';
import { inksInPlay, type Ground } from './improve-ground.ts';

/** Loads that differ from equal ones by less than this share of them count as equal, by area. */
const millionth = 1e-6;

/**
 * Even use: the sum of squared differences of what each ink carries from the mean, over the inks that are
 * not reserved. By count (each region 1) or by the areas given. The bound fills up what is locked: by
 * count to whole regions.
 */
export class EvenAim implements Aim {
	value = 0;
	readonly bound: number;
	readonly enough: number;
	readonly scales: number;
	readonly descends = true;
	readonly kind: 'even-count' | 'even-area';
	private readonly weights: Float64Array;
	private readonly load: Float64Array;
	private readonly inks: number[];
	private readonly mean: number;
	private weighed = { c: 0, d: 0, shift: 0, value: 0 };

	constructor(
		private readonly ground: Ground,
		kind: 'even-count' | 'even-area',
	) {
		this.kind = kind;
		this.scales = kind === 'even-area' ? 3 : 1;
		const { board, first, regionAt, problem } = ground;
		const areas = kind === 'even-area' ? problem.areas : undefined;
		const weigh = (region: number) => (areas ? areas[region] : 1);
		this.weights = new Float64Array(board.graph.count);
		for (let v = 0; v < this.weights.length; v++) {
			for (let p = first[v]; p < first[v + 1]; p++) this.weights[v] += weigh(regionAt[p]);
		}
		this.load = new Float64Array(board.inks);
		this.inks = inksInPlay(ground);
		this.read();
		const total = this.inks.reduce((sum, ink) => sum + this.load[ink], 0);
		this.mean = total / this.inks.length;
		const filled = filledUp(this.locked(), total, kind === 'even-count');
		this.bound = filled.reduce((sum, load) => sum + (load - this.mean) ** 2, 0);
		const spare = kind === 'even-area' ? this.inks.length * (millionth * this.mean) ** 2 : 0;
		this.enough = this.bound + spare / 4 + 1e-9;
		this.value = this.valueOf(-1, -1, 0);
	}

	read(): void {
		const { ink } = this.ground.board;
		this.load.fill(0);
		for (let v = 0; v < ink.length; v++) this.load[ink[v]] += this.weights[v];
		this.value = this.valueOf(-1, -1, 0);
	}

	after(chain: Uint32Array, c: number, d: number): number {
		const { ink } = this.ground.board;
		let shift = 0;
		for (const v of chain) shift += ink[v] === c ? this.weights[v] : -this.weights[v];
		const value = this.valueOf(c, d, shift);
		this.weighed = { c, d, shift, value };
		return value;
	}

	keep(): void {
		const { c, d, shift, value } = this.weighed;
		this.load[c] -= shift;
		this.load[d] += shift;
		this.value = value;
	}

	forget(): void {}

	private valueOf(c: number, d: number, shift: number): number {
		let sum = 0;
		for (const ink of this.inks) {
			const moved = ink === c ? -shift : ink === d ? shift : 0;
			sum += (this.load[ink] + moved - this.mean) ** 2;
		}
		return sum;
	}

	private locked(): number[] {
		const { fixed } = this.ground.board;
		const held = new Float64Array(this.load.length);
		if (fixed) fixed.forEach((ink, v) => ink >= 0 && (held[ink] += this.weights[v]));
		return this.inks.map((ink) => held[ink]);
	}
}

/** The evenest loads of that total in which none is below what it holds already. */
export function filledUp(held: readonly number[], total: number, whole: boolean): number[] {
	const ascending = held.toSorted((one, other) => one - other);
	let level = 0;
	for (let i = 0; i < ascending.length; i++) {
		const above = ascending.slice(i + 1).reduce((sum, one) => sum + one, 0);
		level = (total - above) / (i + 1);
		if (i + 1 === ascending.length || level <= ascending[i + 1]) break;
	}
	if (!whole) return held.map((one) => Math.max(one, level));
	const low = Math.floor(level + 1e-9);
	const loads = held.map((one) => Math.max(one, low));
	let left = total - loads.reduce((sum, one) => sum + one, 0);
	return loads.map((one) => (one === low && left-- > 0 ? one + 1 : one));
}
