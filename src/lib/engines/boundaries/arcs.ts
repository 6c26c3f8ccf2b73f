import { GrowingFloats, GrowingInts } from '../geometry/growing.ts';
import { Room } from '../geometry/room.ts';
import type { Outlines } from './outlines.ts';
import { isKept, SegmentEnds } from './segment-ends.ts';
import type { Segments } from './segments.ts';

/** Segments chained into arcs between places where three or more meet; closed where none do. */
export interface Arcs {
	/** positions of all arcs in turn, interleaved; a closed arc ends where it began */
	points: Float64Array;
	/** arcs + 1: first point of each */
	starts: Int32Array;
	/** vertex number of the first and last point of each, interleaved */
	ends: Int32Array;
	left: Int32Array;
	right: Int32Array;
}

export function chainArcs(outlines: Outlines, segments: Segments, room = new Room()): Arcs {
	const ends = new SegmentEnds(outlines.vertices, segments, room);
	const chain = new ArcChain(segments, ends, outlines, room);
	for (let v = 0; v < outlines.vertices; v++) {
		if (ends.isNode(v)) chain.fromNode(v);
	}
	for (let i = 0; i < segments.count; i++) {
		if (isKept(segments, i)) chain.closedFrom(i);
	}
	ends.giveBack(room);
	return chain.arcs();
}

class ArcChain {
	private used: Uint8Array;
	private positions: Float64Array;
	private points: GrowingFloats;
	private firstAndLast = new GrowingInts();
	private starts = new GrowingInts();
	private left = new GrowingInts();
	private right = new GrowingInts();

	constructor(
		private segments: Segments,
		private ends: SegmentEnds,
		outlines: Outlines,
		room: Room,
	) {
		this.used = room.zeroBytes(segments.count);
		this.positions = outlines.positions;
		this.points = new GrowingFloats(2 * segments.count + 8 * outlines.ringStarts.length);
	}

	fromNode(node: number): void {
		const { ends, used } = this;
		for (let k = 0; k < ends.degree(node); k++) {
			const segment = ends.at(node, k);
			if (!used[segment]) this.walk(node, segment);
		}
	}

	/** A ring without nodes, started at its least vertex so that the file's starting point is nothing. */
	closedFrom(segment: number): void {
		if (this.used[segment]) return;
		const first = this.leastVertex(segment);
		this.walk(first, this.ends.at(first, 0));
	}

	arcs(): Arcs {
		this.starts.push(this.points.length / 2);
		return {
			points: this.points.trimmed(),
			ends: this.firstAndLast.taken(),
			starts: this.starts.taken(),
			left: this.left.taken(),
			right: this.right.taken(),
		};
	}

	private walk(from: number, first: number): void {
		const { segments, ends, used } = this;
		const forward = segments.low[first] === from;
		this.left.push(forward ? segments.left[first] : segments.right[first]);
		this.right.push(forward ? segments.right[first] : segments.left[first]);
		this.starts.push(this.points.length / 2);
		this.put(from);
		let v = from;
		let s = first;
		for (;;) {
			used[s] = 1;
			v = segments.low[s] === v ? segments.high[s] : segments.low[s];
			this.put(v);
			if (v === from || ends.isNode(v)) break;
			s = ends.other(v, s);
		}
		this.firstAndLast.push(from);
		this.firstAndLast.push(v);
	}

	private put(v: number): void {
		this.points.push2(this.positions[2 * v], this.positions[2 * v + 1]);
	}

	private leastVertex(segment: number): number {
		const { segments, ends, positions } = this;
		const start = segments.low[segment];
		let least = start;
		let v = start;
		let s = segment;
		do {
			v = segments.low[s] === v ? segments.high[s] : segments.low[s];
			if (isBefore(positions, v, least)) least = v;
			s = ends.other(v, s);
		} while (v !== start);
		return least;
	}
}

function isBefore(positions: Float64Array, a: number, b: number): boolean {
	const x = positions[2 * a] - positions[2 * b];
	return x < 0 || (x === 0 && positions[2 * a + 1] < positions[2 * b + 1]);
}
