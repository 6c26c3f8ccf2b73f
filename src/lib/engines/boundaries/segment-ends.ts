import type { Room } from '../geometry/room.ts';
import type { Segments } from './segments.ts';

/** A segment with the same region on both sides is inside it (two parts that touch, or a spike): left out. */
export const isKept = (s: Segments, i: number) => s.left[i] !== s.right[i];

const many = 255;

/**
 * Which segments end at a vertex, in the order of their numbers. Nearly every vertex has two, kept as the
 * first of them and the difference in bits to the second; the few with more have lists.
 */
export class SegmentEnds {
	private first: Int32Array;
	private link: Int32Array;
	/** how many end here; `many` for that or more */
	private degrees: Uint8Array;
	/** 1 where an arc must end */
	private nodes: Uint8Array;
	private crowds = new Map<number, number[]>();

	constructor(
		vertices: number,
		private segments: Segments,
		room: Room,
	) {
		this.first = room.ints(vertices);
		this.link = room.zeros(vertices);
		this.degrees = room.zeroBytes(vertices);
		const { low, high, count } = segments;
		for (let i = 0; i < count; i++) {
			if (!isKept(segments, i)) continue;
			this.add(low[i], i);
			this.add(high[i], i);
		}
		// asked for twice at most places, where one byte is nearer at hand than both segments
		this.nodes = room.zeroBytes(vertices);
		for (let v = 0; v < vertices; v++) if (this.endsArcs(v)) this.nodes[v] = 1;
	}

	/** Nothing may be asked any more. */
	giveBack(room: Room): void {
		for (const array of [this.first, this.link, this.degrees, this.nodes]) room.give(array);
	}

	degree(v: number): number {
		const degree = this.degrees[v];
		return degree > 2 ? (this.crowds.get(v) as number[]).length : degree;
	}

	at(v: number, k: number): number {
		if (this.degrees[v] > 2) return (this.crowds.get(v) as number[])[k];
		return k === 0 ? this.first[v] : this.link[v] ^ this.first[v];
	}

	/** The other one of two. */
	other(v: number, segment: number): number {
		return this.link[v] ^ segment;
	}

	/** Where an arc must end: not exactly two segments, or two that do not divide the same pair. */
	isNode(v: number): boolean {
		return this.nodes[v] === 1;
	}

	private endsArcs(v: number): boolean {
		const degree = this.degrees[v];
		if (degree !== 2) return degree > 0;
		const { left, right, low, high } = this.segments;
		const a = this.first[v];
		const b = this.link[v] ^ a;
		return (high[a] === v) === (low[b] === v)
			? left[a] !== left[b] || right[a] !== right[b]
			: left[a] !== right[b] || right[a] !== left[b];
	}

	private add(v: number, segment: number): void {
		const degree = this.degrees[v];
		if (degree === 0) this.first[v] = segment;
		else if (degree === 2) {
			this.crowds.set(v, [this.first[v], this.link[v] ^ this.first[v], segment]);
		} else if (degree > 2) this.crowds.get(v)?.push(segment);
		this.link[v] ^= segment;
		if (degree < many) this.degrees[v]++;
	}
}
