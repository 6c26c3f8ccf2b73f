import type { Outlines } from './outlines.ts';

/**
 * Undirected segments between vertices, each once, with the region on either side. A segment is found
 * through the chain of its lower vertex, so no second hash is needed; mostly not even that, since a border
 * walked again meets its segments in the order of their numbers. Two regions on the same side of one
 * segment overlap: the second gets a parallel segment of its own.
 */
export interface Segments {
	count: number;
	/** lower and higher vertex number */
	low: Uint32Array;
	high: Uint32Array;
	/** region on the left and right of the walk from low to high, -1 for none */
	left: Int32Array;
	right: Int32Array;
	/** how many segments lie on another between the same vertices, and which */
	parallel: number;
	twins: number[];
}

/** Indexes every edge of every ring; rings are walked with their region on the left. */
export function indexSegments(outlines: Outlines): Segments {
	const index = new SegmentIndex(outlines.vertices, outlines.ringVertices.length);
	const { ringVertices, ringStarts, ringRegion } = outlines;
	for (let ring = 0; ring < ringRegion.length; ring++) {
		const end = ringStarts[ring + 1];
		let from = ringVertices[end - 1];
		for (let i = ringStarts[ring]; i < end; i++) {
			index.add(from, ringVertices[i], ringRegion[ring]);
			from = ringVertices[i];
		}
	}
	return index.segments();
}

class SegmentIndex {
	/** first segment of each vertex and next of each segment, counted from 1; 0 for none */
	private head: Int32Array;
	private next: Int32Array;
	private low: Uint32Array;
	private high: Uint32Array;
	private left: Int32Array;
	private right: Int32Array;
	private count = 0;
	private previous = 0;
	private twins: number[] = [];

	constructor(vertices: number, most: number) {
		this.head = new Int32Array(vertices);
		this.next = new Int32Array(most);
		this.low = new Uint32Array(most);
		this.high = new Uint32Array(most);
		this.left = new Int32Array(most);
		this.right = new Int32Array(most);
	}

	add(from: number, to: number, region: number): void {
		const forward = from < to;
		const low = forward ? from : to;
		const high = forward ? to : from;
		const side = forward ? this.left : this.right;
		const { previous } = this;
		if (this.joins(previous - 1, low, high, side, region)) return;
		if (this.joins(previous + 1, low, high, side, region)) return;
		let twin = false;
		for (let s = this.head[low] - 1; s >= 0; s = this.next[s] - 1) {
			if (this.high[s] !== high) continue;
			if (side[s] < 0) {
				side[s] = region;
				this.previous = s;
				return;
			}
			twin = true;
		}
		const s = (this.previous = this.count++);
		if (twin) this.twins.push(s);
		this.low[s] = low;
		this.high[s] = high;
		this.left[s] = forward ? region : -1;
		this.right[s] = forward ? -1 : region;
		this.next[s] = this.head[low];
		this.head[low] = s + 1;
	}

	/** Takes a side of a segment when it is the one between these vertices and the side is free. */
	private joins(s: number, low: number, high: number, side: Int32Array, region: number): boolean {
		if (s < 0 || s >= this.count) return false;
		if (this.low[s] !== low || this.high[s] !== high || side[s] >= 0) return false;
		side[s] = region;
		this.previous = s;
		return true;
	}

	segments(): Segments {
		const { count, twins } = this;
		return {
			count,
			parallel: twins.length,
			twins,
			low: this.low.subarray(0, count),
			high: this.high.subarray(0, count),
			left: this.left.subarray(0, count),
			right: this.right.subarray(0, count),
		};
	}
}
