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
		const { arcPoints } = this.arcs;
		let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
		for (let i = first; i <= end; i++) {
			west = Math.min(west, arcPoints[2 * i]);
			east = Math.max(east, arcPoints[2 * i]);
			south = Math.min(south, arcPoints[2 * i + 1]);
			north = Math.max(north, arcPoints[2 * i + 1]);
		}
		this.index.add(west, south, east, north);
		this.blockArc[block] = arc;
		this.blockFirst[block] = first;
		this.blockEnd[block] = end;
	}
}

const blocksOf = (segments: number) => Math.ceil(segments / blockSegments);
