import Flatbush from 'flatbush';
import type { Coverage } from '../geometry/coverage.ts';
import { metresPerDegree } from '../geometry/ellipsoid.ts';

const runSegments = 12;

/** Runs of up to twelve segments along lines with a region on one side only, in a spatial index. */
export class CoastRuns {
	readonly count: number;
	readonly region: Int32Array;
	/** first and last point of each run */
	readonly first: Int32Array;
	readonly last: Int32Array;
	/** west, south, east, north */
	readonly boxes: Float64Array;
	/** whether the map goes right round the world, so that its two ends are neighbours */
	readonly isRound: boolean;
	private index: Flatbush;

	constructor({ arcLeft, arcRight, arcStarts, arcPoints }: Coverage) {
		const runs: [region: number, first: number, last: number][] = [];
		for (let arc = 0; arc < arcLeft.length; arc++) {
			if (arcLeft[arc] >= 0 && arcRight[arc] >= 0) continue;
			const end = arcStarts[arc + 1] - 1;
			for (let first = arcStarts[arc]; first < end; first += runSegments) {
				const last = Math.min(first + runSegments, end);
				runs.push([Math.max(arcLeft[arc], arcRight[arc]), first, last]);
			}
		}
		this.count = runs.length;
		this.region = Int32Array.from(runs, ([region]) => region);
		this.first = Int32Array.from(runs, ([, first]) => first);
		this.last = Int32Array.from(runs, ([, , last]) => last);
		this.boxes = new Float64Array(4 * runs.length);
		this.index = new Flatbush(Math.max(1, runs.length));
		let [west, east] = [Infinity, -Infinity];
		runs.forEach(([, first, last], run) => {
			const box = this.boxes.subarray(4 * run, 4 * run + 4);
			fillBox(arcPoints, first, last, box);
			this.index.add(box[0], box[1], box[2], box[3]);
			west = Math.min(west, box[0]);
			east = Math.max(east, box[2]);
		});
		if (runs.length === 0) this.index.add(0, 0, 0, 0);
		this.index.finish();
		this.isRound = east - west > 359;
	}

	/** Calls `found` for runs whose boxes may lie within `metres` of that of `run`, moved by `turn` degrees. */
	around(run: number, metres: number, turn: number, found: (other: number) => void): void {
		const [west, south, east, north] = this.boxes.subarray(4 * run, 4 * run + 4);
		const dy = (metres / metresPerDegree(0).north) * 1.01;
		const farthest = Math.min(90, Math.max(Math.abs(south), Math.abs(north)) + dy);
		const dx = Math.min(360, (metres / metresPerDegree(farthest).east) * 1.01);
		const [x0, x1] = [west - dx + turn, east + dx + turn];
		this.index.search(x0, south - dy, x1, north + dy, (other) => {
			if (other < this.count) found(other);
			return false;
		});
	}

	/** No two places of two runs are nearer than this, in metres. */
	apart(run: number, other: number, turn: number): number {
		const b = this.boxes;
		const [i, j] = [4 * run, 4 * other];
		const dx = Math.max(0, b[i] - b[j + 2] + turn, b[j] - b[i + 2] - turn);
		const dy = Math.max(0, b[i + 1] - b[j + 3], b[j + 1] - b[i + 3]);
		const farthest = Math.max(...[b[i + 1], b[i + 3], b[j + 1], b[j + 3]].map(Math.abs));
		const least = metresPerDegree(0).north;
		return Math.hypot(dx * metresPerDegree(farthest).east, dy * least) * 0.99;
	}
}

function fillBox(p: Float64Array, first: number, last: number, box: Float64Array): void {
	box[0] = box[1] = Infinity;
	box[2] = box[3] = -Infinity;
	for (let i = first; i <= last; i++) {
		box[0] = Math.min(box[0], p[2 * i]);
		box[1] = Math.min(box[1], p[2 * i + 1]);
		box[2] = Math.max(box[2], p[2 * i]);
		box[3] = Math.max(box[3], p[2 * i + 1]);
	}
}
