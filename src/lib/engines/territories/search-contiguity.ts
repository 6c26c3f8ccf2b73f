import type { RegionGraph } from '../graph/region-graph.ts';

/**
 * Whether a territory stays in one piece when a unit leaves. First the leaver's neighbours are looked at
 * among themselves, which settles most cases; then the territory is walked until all of them are met.
 * Stamps are unsigned and never cleared but on overflow.
 */
export class PieceTest {
	private readonly graph: RegionGraph;
	private readonly stamps: Uint32Array;
	private readonly queue: Int32Array;
	private readonly near: Int32Array;
	private stamp = 0;

	constructor(graph: RegionGraph) {
		this.graph = graph;
		this.stamps = new Uint32Array(graph.count);
		this.queue = new Int32Array(graph.count);
		this.near = new Int32Array(graph.count);
	}

	/**
	 * Whether the units of `territory` other than `unit` are joined, given that with it they are.
	 * False too when none would be left.
	 */
	mayLeave(assignment: Int32Array, unit: number, territory: number): boolean {
		const { offsets, targets } = this.graph;
		const { near } = this;
		let count = 0;
		for (let i = offsets[unit], end = offsets[unit + 1]; i < end; i++) {
			const other = targets[i];
			if (assignment[other] === territory) near[count++] = other;
		}
		if (count < 2) return count === 1;
		const unmet = this.amongThemselves(count);
		return unmet === 0 || this.throughTheRest(assignment, unit, territory, unmet);
	}

	private nextStamp(): number {
		if (this.stamp > 0xfffffff0) {
			this.stamps.fill(0);
			this.stamp = 0;
		}
		return ++this.stamp;
	}

	/** Neighbours of the leaver that its first one does not reach over the others; they keep `wanted`. */
	private amongThemselves(count: number): number {
		const { offsets, targets } = this.graph;
		const { stamps, queue, near } = this;
		const wanted = this.nextStamp();
		const met = this.nextStamp();
		for (let i = 0; i < count; i++) stamps[near[i]] = wanted;
		stamps[near[0]] = met;
		queue[0] = near[0];
		let tail = 1;
		for (let head = 0; head < tail && tail < count; head++) {
			const at = queue[head];
			for (let i = offsets[at], end = offsets[at + 1]; i < end; i++) {
				const other = targets[i];
				if (stamps[other] !== wanted) continue;
				stamps[other] = met;
				queue[tail++] = other;
			}
		}
		return count - tail;
	}

	/** Walks on from the neighbours already met, which head the queue. */
	private throughTheRest(
		assignment: Int32Array,
		unit: number,
		territory: number,
		unmet: number,
	): boolean {
		const { offsets, targets } = this.graph;
		const { stamps, queue } = this;
		const met = this.stamp;
		const wanted = met - 1;
		let tail = 0;
		for (let i = offsets[unit], end = offsets[unit + 1]; i < end; i++) {
			if (stamps[targets[i]] === met) queue[tail++] = targets[i];
		}
		stamps[unit] = met;
		for (let head = 0; head < tail; head++) {
			const at = queue[head];
			for (let i = offsets[at], end = offsets[at + 1]; i < end; i++) {
				const other = targets[i];
				if (assignment[other] !== territory || stamps[other] === met) continue;
				if (stamps[other] === wanted && --unmet === 0) return true;
				stamps[other] = met;
				queue[tail++] = other;
			}
		}
		return false;
	}

	/** Whether the `count` units that `has` holds for are joined; `start` is one of them. */
	joined(start: number, count: number, has: (unit: number) => boolean): boolean {
		const { offsets, targets } = this.graph;
		const { stamps, queue } = this;
		const met = this.nextStamp();
		stamps[start] = met;
		queue[0] = start;
		let tail = 1;
		for (let head = 0; head < tail; head++) {
			const at = queue[head];
			for (let i = offsets[at], end = offsets[at + 1]; i < end; i++) {
				const other = targets[i];
				if (stamps[other] === met || !has(other)) continue;
				stamps[other] = met;
				queue[tail++] = other;
			}
		}
		return tail === count;
	}
}
