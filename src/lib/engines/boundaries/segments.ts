import { Room } from '../geometry/room.ts';
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
	low: Int32Array;
	high: Int32Array;
	/** region on the left and right of the walk from low to high, -1 for none */
	left: Int32Array;
	right: Int32Array;
	/** how many segments lie on another between the same vertices, and which */
	parallel: number;
	twins: number[];
}

/** Indexes every edge of every ring; rings are walked with their region on the left. */
export function indexSegments(outlines: Outlines, room = new Room()): Segments {
	const { ringVertices, ringStarts, ringRegion, vertices } = outlines;
	const index = new SegmentIndex(vertices, ringRegion.length, ringVertices.length, room);
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
	private low: Int32Array;
	private high: Int32Array;
	private left: Int32Array;
	private right: Int32Array;
	private count = 0;
	private previous = 0;
	private twins: number[] = [];

	/**
	 * Where borders are drawn alike twice, there are about as many segments as vertices and rings (Euler's
	 * formula); arrays for as many as the rings have are asked for only when these are full.
	 */
	constructor(
		vertices: number,
		rings: number,
		private most: number,
		private room: Room,
	) {
		const usual = Math.min(most, vertices + rings + 1024);
		this.low = room.ints(usual);
		this.high = room.ints(usual);
		this.left = room.ints(usual);
		this.right = room.ints(usual);
		this.next = room.ints(usual);
		this.head = room.zeros(vertices);
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
		if (this.count === this.low.length) this.grow();
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

	private grow(): void {
		const larger = (array: Int32Array) => {
			const next = new Int32Array(this.most);
			next.set(array);
			this.room.give(array);
			return next;
		};
		this.low = larger(this.low);
		this.high = larger(this.high);
		this.left = larger(this.left);
		this.right = larger(this.right);
		this.next = larger(this.next);
	}

	segments(): Segments {
		const { count, twins } = this;
		this.room.give(this.next);
		this.room.give(this.head);
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
