import type { Aim } from './improve-aim.ts';
import type { Ground } from './improve-ground.ts';

/** How much more a metre along one pair of inks weighs than along the next weakest. */
export const weakerWeighs = 64;

/** For each pair of inks (c * inks + d) its rank, 0 for the weakest; pairs equally far apart share one. */
export function ranksOf(inks: number, distances: readonly (readonly number[])[]): Int32Array {
	const far = (c: number, d: number) => distances[c]?.[d] ?? 0;
	const all = new Set<number>();
	for (let c = 0; c < inks; c++) for (let d = 0; d < c; d++) all.add(far(c, d));
	const order = new Map([...all].sort((a, b) => a - b).map((distance, rank) => [distance, rank]));
	const ranks = new Int32Array(inks * inks).fill(-1);
	for (let c = 0; c < inks; c++) {
		for (let d = 0; d < inks; d++) if (c !== d) ranks[c * inks + d] = order.get(far(c, d)) ?? -1;
	}
	return ranks;
}

/**
 * Distinct neighbours, the weakest pair of inks first: metres along each pair of inks, a metre along one
 * weighing as much as 64 along the next weakest, so that what the weakest gains is hardly ever given up
 * for the others.
 */
export class DistinctAim implements Aim {
	readonly kind = 'distinct';
	readonly bound = 0;
	readonly enough = 0;
	readonly scales: number;
	readonly descends = false;
	value = 0;
	private readonly ranks: Int32Array;
	private readonly weights: Float64Array;
	private readonly along: Float64Array;
	private readonly shift: Float64Array;
	private readonly metres: Float64Array;
	private weighed = 0;

	constructor(private readonly ground: Ground) {
		const { board, problem } = ground;
		this.ranks = ranksOf(board.inks, problem.inkDistances ?? []);
		const count = this.ranks.reduce((most, rank) => Math.max(most, rank + 1), 1);
		this.scales = Math.min(4, count);
		this.weights = Float64Array.from({ length: count }, (_, rank) => weakerWeighs ** -rank);
		this.along = new Float64Array(count);
		this.shift = new Float64Array(count);
		this.metres = ground.metres();
		this.read();
	}

	read(): void {
		const { vertexAt, board, borders } = this.ground;
		const { offsets, targets } = borders;
		this.along.fill(0);
		for (let p = 0; p < borders.count; p++) {
			const row = board.ink[vertexAt[p]] * board.inks;
			for (let e = offsets[p]; e < offsets[p + 1]; e++) {
				if (targets[e] < p) continue;
				this.along[this.ranks[row + board.ink[vertexAt[targets[e]]]]] += this.metres[e];
			}
		}
		this.shift.fill(0);
		this.value = this.valued();
	}

	/** Only borders between the chain and regions of a third ink change. */
	after(chain: Uint32Array, c: number, d: number): number {
		const { first, vertexAt, board, borders } = this.ground;
		const { offsets, targets } = borders;
		const { ink, inks } = board;
		const { ranks, shift, metres } = this;
		shift.fill(0);
		for (const v of chain) {
			const now = ink[v] * inks;
			const then = (ink[v] === c ? d : c) * inks;
			for (let e = offsets[first[v]]; e < offsets[first[v + 1]]; e++) {
				const other = ink[vertexAt[targets[e]]];
				if (other === c || other === d) continue;
				shift[ranks[now + other]] -= metres[e];
				shift[ranks[then + other]] += metres[e];
			}
		}
		return (this.weighed = this.valued());
	}

	keep(): void {
		for (let rank = 0; rank < this.along.length; rank++) this.along[rank] += this.shift[rank];
		this.value = this.weighed;
	}

	forget(): void {}

	private valued(): number {
		let sum = 0;
		for (let rank = 0; rank < this.along.length; rank++) {
			sum += (this.along[rank] + this.shift[rank]) * this.weights[rank];
		}
		return sum;
	}
}
