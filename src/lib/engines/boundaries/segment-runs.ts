import Flatbush from 'flatbush';
import type { Segments } from './segments.ts';

const runLength = 8;

/** A spatial index over a list of segments, eight to a box: an eighth of the boxes of one for each. */
export class SegmentRuns {
	private index: Flatbush;
	/** west, south, east, north of each segment of the list */
	private boxes: Float64Array;
	/** runs that are searched: those with a changed segment, or all */
	private indexed: number[] = [];
	/** the same of each run */
	private runBoxes: Float64Array;

	constructor(
		private list: Uint32Array,
		segments: Segments,
		positions: Float64Array,
		changed: Uint8Array | null = null,
	) {
		this.boxes = boxesOf(list, segments, positions);
		this.runBoxes = new Float64Array(4 * Math.ceil(list.length / runLength));
		const { boxes, runBoxes: r } = this;
		for (const [from, to] of this.runs()) {
			const k = (4 * from) / runLength;
			r.set(boxes.subarray(4 * from, 4 * from + 4), k);
			for (let i = 4 * from; i < 4 * to; i += 4) {
				if (boxes[i] < r[k]) r[k] = boxes[i];
				if (boxes[i + 1] < r[k + 1]) r[k + 1] = boxes[i + 1];
				if (boxes[i + 2] > r[k + 2]) r[k + 2] = boxes[i + 2];
				if (boxes[i + 3] > r[k + 3]) r[k + 3] = boxes[i + 3];
			}
			if (!changed || hasChanged(list.subarray(from, to), segments, changed)) {
				this.indexed.push(k / 4);
			}
		}
		this.index = new Flatbush(Math.max(1, this.indexed.length));
		for (const run of this.indexed) {
			const k = 4 * run;
			this.index.add(r[k], r[k + 1], r[k + 2], r[k + 3]);
		}
		if (this.indexed.length === 0) this.index.add(Infinity, Infinity, Infinity, Infinity);
		this.index.finish();
	}

	/** First and last but one place in the list of each run. */
	*runs(): Generator<[from: number, to: number]> {
		for (let from = 0; from < this.list.length; from += runLength) {
			yield [from, Math.min(from + runLength, this.list.length)];
		}
	}

	/** The runs whose boxes lie within `dx` and `dy` degrees of a run that begins at `from`. */
	near(from: number, dx: number, dy: number): number[] {
		const box = this.runBoxes.subarray((4 * from) / runLength, (4 * from) / runLength + 4);
		if (this.indexed.length === 0) return [];
		const found = this.index.search(box[0] - dx, box[1] - dy, box[2] + dx, box[3] + dy);
		return found.map((item) => this.indexed[item]);
	}

	/** Calls `found` for each segment of a run whose box lies within `dx` and `dy` degrees of a place. */
	around(
		run: number,
		x: number,
		y: number,
		dx: number,
		dy: number,
		found: (segment: number) => void,
	): void {
		const { boxes, runBoxes: r, list } = this;
		const k = 4 * run;
		if (r[k] > x + dx || r[k + 2] < x - dx || r[k + 1] > y + dy || r[k + 3] < y - dy) return;
		const end = Math.min((run + 1) * runLength, list.length);
		for (let i = run * runLength; i < end; i++) {
			const b = 4 * i;
			if (boxes[b] > x + dx || boxes[b + 2] < x - dx) continue;
			if (boxes[b + 1] > y + dy || boxes[b + 3] < y - dy) continue;
			found(list[i]);
		}
	}

	/** The greatest distance from the equator in a run, in degrees. */
	mostNorth(from: number): number {
		const k = (4 * from) / runLength;
		return Math.max(Math.abs(this.runBoxes[k + 1]), Math.abs(this.runBoxes[k + 3]));
	}
}

const hasChanged = (run: Uint32Array, { low, high }: Segments, changed: Uint8Array) =>
	run.some((s) => changed[low[s]] === 1 || changed[high[s]] === 1);

function boxesOf(list: Uint32Array, segments: Segments, positions: Float64Array): Float64Array {
	const boxes = new Float64Array(4 * list.length);
	for (let i = 0; i < list.length; i++) {
		const u = 2 * segments.low[list[i]];
		const v = 2 * segments.high[list[i]];
		boxes[4 * i] = Math.min(positions[u], positions[v]);
		boxes[4 * i + 1] = Math.min(positions[u + 1], positions[v + 1]);
		boxes[4 * i + 2] = Math.max(positions[u], positions[v]);
		boxes[4 * i + 3] = Math.max(positions[u + 1], positions[v + 1]);
	}
	return boxes;
}
