import { GrowingInts } from '../geometry/growing.ts';
import type { Outlines } from './outlines.ts';
import type { Segments } from './segments.ts';

/** Segments chained into arcs between places where three or more meet; closed where none do. */
export interface Arcs {
	/** vertex numbers of all arcs in turn; a closed arc ends with its first vertex */
	vertices: Int32Array;
	/** arcs + 1 */
	starts: Int32Array;
	left: Int32Array;
	right: Int32Array;
}

/** A segment with the same region on both sides is inside it (two parts that touch, or a spike): left out. */
const isKept = (s: Segments, i: number) => s.left[i] !== s.right[i];

export function chainArcs(outlines: Outlines, segments: Segments): Arcs {
	const ends = segmentEnds(outlines.vertices, segments);
	const chain = new ArcChain(segments, ends);
	for (let v = 0; v < outlines.vertices; v++) {
		if (isNode(v, ends, segments)) chain.fromNode(v);
	}
	for (let i = 0; i < segments.count; i++) {
		if (isKept(segments, i)) chain.closedFrom(i, outlines.positions);
	}
	return chain.arcs();
}

interface SegmentEnds {
	/** vertices + 1: first entry of each vertex in `list` */
	offsets: Uint32Array;
	list: Uint32Array;
}

function segmentEnds(vertices: number, segments: Segments): SegmentEnds {
	const offsets = new Uint32Array(vertices + 1);
	const { low, high } = segments;
	for (let i = 0; i < segments.count; i++) {
		if (!isKept(segments, i)) continue;
		offsets[low[i] + 1]++;
		offsets[high[i] + 1]++;
	}
	for (let v = 0; v < vertices; v++) offsets[v + 1] += offsets[v];
	const list = new Uint32Array(offsets[vertices]);
	const fill = offsets.slice(0, vertices);
	for (let i = 0; i < segments.count; i++) {
		if (!isKept(segments, i)) continue;
		list[fill[low[i]]++] = i;
		list[fill[high[i]]++] = i;
	}
	return { offsets, list };
}

/** Where an arc must end: not exactly two segments, or two that do not divide the same pair. */
function isNode(v: number, ends: SegmentEnds, segments: Segments): boolean {
	const first = ends.offsets[v];
	const degree = ends.offsets[v + 1] - first;
	if (degree !== 2) return degree > 0;
	const a = ends.list[first];
	const b = ends.list[first + 1];
	const arriving = segments.high[a] === v;
	const leaving = segments.low[b] === v;
	const same = arriving === leaving;
	return same
		? segments.left[a] !== segments.left[b] || segments.right[a] !== segments.right[b]
		: segments.left[a] !== segments.right[b] || segments.right[a] !== segments.left[b];
}

class ArcChain {
	private used: Uint8Array;
	private vertices = new GrowingInts();
	private starts = new GrowingInts();
	private left = new GrowingInts();
	private right = new GrowingInts();

	constructor(
		private segments: Segments,
		private ends: SegmentEnds,
	) {
		this.used = new Uint8Array(segments.count);
	}

	fromNode(node: number): void {
		for (let k = this.ends.offsets[node]; k < this.ends.offsets[node + 1]; k++) {
			const segment = this.ends.list[k];
			if (!this.used[segment]) this.walk(node, segment);
		}
	}

	/** A ring without nodes, started at its least vertex so that the file's starting point is nothing. */
	closedFrom(segment: number, positions: Float64Array): void {
		if (this.used[segment]) return;
		const first = this.leastVertex(segment, positions);
		this.walk(first, this.ends.list[this.ends.offsets[first]]);
	}

	arcs(): Arcs {
		this.starts.push(this.vertices.length);
		return {
			vertices: this.vertices.taken(),
			starts: this.starts.taken(),
			left: this.left.taken(),
			right: this.right.taken(),
		};
	}

	private walk(from: number, first: number): void {
		const { segments, ends, used, vertices } = this;
		const forward = segments.low[first] === from;
		this.left.push(forward ? segments.left[first] : segments.right[first]);
		this.right.push(forward ? segments.right[first] : segments.left[first]);
		this.starts.push(vertices.length);
		vertices.push(from);
		let v = from;
		let s = first;
		for (;;) {
			used[s] = 1;
			v = segments.low[s] === v ? segments.high[s] : segments.low[s];
			vertices.push(v);
			if (v === from || isNode(v, ends, segments)) return;
			const k = ends.offsets[v];
			s = ends.list[k] === s ? ends.list[k + 1] : ends.list[k];
		}
	}

	private leastVertex(segment: number, positions: Float64Array): number {
		const { segments, ends } = this;
		const start = segments.low[segment];
		let least = start;
		let v = start;
		let s = segment;
		do {
			v = segments.low[s] === v ? segments.high[s] : segments.low[s];
			if (isBefore(positions, v, least)) least = v;
			const k = ends.offsets[v];
			s = ends.list[k] === s ? ends.list[k + 1] : ends.list[k];
		} while (v !== start);
		return least;
	}
}

function isBefore(positions: Float64Array, a: number, b: number): boolean {
	const x = positions[2 * a] - positions[2 * b];
	return x < 0 || (x === 0 && positions[2 * a + 1] < positions[2 * b + 1]);
}
