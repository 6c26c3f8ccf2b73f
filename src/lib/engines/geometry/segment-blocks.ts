import Flatbush from 'flatbush';
import type { Coverage } from './coverage.ts';

const blockSegments = 12;

type Arcs = Pick<Coverage, 'arcPoints' | 'arcStarts' | 'arcLeft' | 'arcRight'>;

/**
 * A spatial index over all segments of a coverage, in runs of up to twelve along an arc: a twelfth of the
 * boxes of one for each segment. A segment is named by its arc and its first point.
 */
export class SegmentBlocks {
	private index: Flatbush;
	private blockArc: Int32Array;
	private blockFirst: Int32Array;
	private blockEnd: Int32Array;
	private box = new Float64Array(4);

	constructor(readonly arcs: Arcs) {
		const { arcStarts } = arcs;
		const count = arcStarts.length - 1;
		let blocks = 0;
		for (let a = 0; a < count; a++) blocks += blocksOf(arcStarts[a + 1] - arcStarts[a] - 1);
		this.index = new Flatbush(Math.max(1, blocks));
		this.blockArc = new Int32Array(Math.max(1, blocks));
		this.blockFirst = new Int32Array(Math.max(1, blocks));
		this.blockEnd = new Int32Array(Math.max(1, blocks));
		let block = 0;
		for (let a = 0; a < count; a++) {
			const last = arcStarts[a + 1] - 1;
			for (let first = arcStarts[a]; first < last; first += blockSegments) {
				this.add(block++, a, first, Math.min(first + blockSegments, last));
			}
		}
		if (blocks === 0) this.index.add(0, 0, 0, 0);
		this.index.finish();
	}

	/** Calls `found` for every segment of every run whose box meets the box given. */
	search(
		west: number,
		south: number,
		east: number,
		north: number,
		found: (arc: number, point: number) => void,
	): void {
		this.index.search(west, south, east, north, (block) => {
			for (let i = this.blockFirst[block]; i < this.blockEnd[block]; i++) {
				found(this.blockArc[block], i);
			}
			return false;
		});
	}

	/**
	 * Calls `found` for every pair of segments whose boxes meet and of which at least one lies on an arc
	 * that is `wanted`: each pair once, neighbours along a line among them.
	 */
	eachPair(
		wanted: (arc: number) => boolean,
		found: (arc: number, point: number, other: number, otherPoint: number) => void,
	): void {
		const { arcPoints: p, arcStarts } = this.arcs;
		if (arcStarts.length < 2) return;
		const box = new Float64Array(4);
		for (let block = 0; block < this.blockArc.length; block++) {
			if (!wanted(this.blockArc[block])) continue;
			boxOfRun(p, this.blockFirst[block], this.blockEnd[block], box);
			this.index.search(box[0], box[1], box[2], box[3], (other) => {
				if (other > block || !wanted(this.blockArc[other])) this.pairsOf(block, other, box, found);
				else if (other === block) this.pairsOf(block, block, box, found);
				return false;
			});
		}
	}

	private pairsOf(
		block: number,
		other: number,
		box: Float64Array,
		found: (arc: number, point: number, other: number, otherPoint: number) => void,
	): void {
		const { arcPoints: p } = this.arcs;
		for (let j = this.blockFirst[other]; j < this.blockEnd[other]; j++) {
			if (isApart(p, j, box[0], box[1], box[2], box[3])) continue;
			const west = Math.min(p[2 * j], p[2 * j + 2]);
			const east = Math.max(p[2 * j], p[2 * j + 2]);
			const south = Math.min(p[2 * j + 1], p[2 * j + 3]);
			const north = Math.max(p[2 * j + 1], p[2 * j + 3]);
			const end = block === other ? j : this.blockEnd[block];
			for (let i = this.blockFirst[block]; i < end; i++) {
				if (!isApart(p, i, west, south, east, north)) {
					found(this.blockArc[block], i, this.blockArc[other], j);
				}
			}
		}
	}

	/** Regions that contain a place, by counting the lines between it and the far east. */
	regionsAt(x: number, y: number): number[] {
		const { arcPoints, arcLeft, arcRight } = this.arcs;
		const odd = new Set<number>();
		const toggle = (region: number) => {
			if (region >= 0 && !odd.delete(region)) odd.add(region);
		};
		this.search(x, y, Infinity, y, (arc, i) => {
			const x1 = arcPoints[2 * i];
			const y1 = arcPoints[2 * i + 1];
			const x2 = arcPoints[2 * i + 2];
			const y2 = arcPoints[2 * i + 3];
			if (y1 > y === y2 > y) return;
			const turn = (x2 - x1) * (y - y1) - (x - x1) * (y2 - y1);
			if (turn > 0 !== y2 > y1) return;
			toggle(arcLeft[arc]);
			toggle(arcRight[arc]);
		});
		return [...odd];
	}

	private add(block: number, arc: number, first: number, end: number): void {
		const box = boxOfRun(this.arcs.arcPoints, first, end, this.box);
		this.index.add(box[0], box[1], box[2], box[3]);
		this.blockArc[block] = arc;
		this.blockFirst[block] = first;
		this.blockEnd[block] = end;
	}
}

function boxOfRun(p: Float64Array, first: number, end: number, box: Float64Array): Float64Array {
	box[0] = box[1] = Infinity;
	box[2] = box[3] = -Infinity;
	for (let i = first; i <= end; i++) {
		if (p[2 * i] < box[0]) box[0] = p[2 * i];
		if (p[2 * i + 1] < box[1]) box[1] = p[2 * i + 1];
		if (p[2 * i] > box[2]) box[2] = p[2 * i];
		if (p[2 * i + 1] > box[3]) box[3] = p[2 * i + 1];
	}
	return box;
}

/** Whether a segment lies wholly to one side of a box. */
export function isApart(
	p: Float64Array,
	i: number,
	west: number,
	south: number,
	east: number,
	north: number,
): boolean {
	const k = 2 * i;
	return (
		(p[k] < west && p[k + 2] < west) ||
		(p[k] > east && p[k + 2] > east) ||
		(p[k + 1] < south && p[k + 3] < south) ||
		(p[k + 1] > north && p[k + 3] > north)
	);
}

const blocksOf = (segments: number) => Math.ceil(segments / blockSegments);
