import { GrowingFloats, GrowingInts } from '../geometry/growing.ts';

/**
 * Vertices to be put into segments, by the segment's two ends.
 * Segments are found through a chain at their lower vertex; all is in flat arrays, for a file may need a
 * hundred thousand of them.
 */
export class Inserts {
	/** how many vertices there are to put in */
	count = 0;
	/** first entry of each lower vertex and next of each entry, counted from 1; 0 for none */
	private head: Int32Array;
	private next = new GrowingInts();
	private high = new GrowingInts();
	/** last item of each entry and the one before each item, counted from 1 */
	private last = new GrowingInts();
	private before = new GrowingInts();
	private vertex = new GrowingInts();
	private share = new GrowingFloats();

	constructor(vertices: number) {
		this.head = new Int32Array(vertices);
	}

	/** `share`: how far along from the lower to the higher vertex, 0 to 1. */
	add(low: number, high: number, share: number, vertex: number): void {
		let entry = this.entry(low, high);
		if (entry < 0) {
			entry = this.next.length;
			this.next.push(this.head[low]);
			this.high.push(high);
			this.last.push(0);
			this.head[low] = entry + 1;
		}
		this.before.push(this.last.items[entry]);
		this.vertex.push(vertex);
		this.share.push(share);
		this.last.items[entry] = ++this.count;
	}

	/** Calls `found` for each vertex on the way between two neighbouring ones, in either direction. */
	along(from: number, to: number, found: (vertex: number) => void): void {
		const isForward = from < to;
		const entry = this.entry(isForward ? from : to, isForward ? to : from);
		if (entry < 0) return;
		const items = this.itemsOf(entry);
		for (let k = 0; k < items.length; k++) {
			found(this.vertex.items[items[isForward ? k : items.length - 1 - k]]);
		}
	}

	private entry(low: number, high: number): number {
		let entry = this.head[low] - 1;
		while (entry >= 0 && this.high.items[entry] !== high) entry = this.next.items[entry] - 1;
		return entry;
	}

	/** By share, then by vertex number. */
	private itemsOf(entry: number): number[] {
		const items: number[] = [];
		for (let i = this.last.items[entry]; i > 0; i = this.before.items[i - 1]) items.push(i - 1);
		if (items.length < 2) return items;
		const { items: share } = this.share;
		const { items: vertex } = this.vertex;
		return items.sort((a, b) => share[a] - share[b] || vertex[a] - vertex[b]);
	}
}
