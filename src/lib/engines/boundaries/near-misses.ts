import Flatbush from 'flatbush';
import { metresPerDegree } from '../geometry/ellipsoid.ts';
import { nearestOnSegment } from '../geometry/near.ts';
import type { Segments } from './segments.ts';

/** A vertex close to a segment that it is not an end of. */
export interface NearMiss {
	point: number;
	segment: number;
	/** to the segment */
	metres: number;
	/** the nearer end, and metres to it */
	end: number;
	endMetres: number;
	/** 0 to 1 along the segment from its low vertex */
	share: number;
}

/**
 * Segments with a region on one side only: coasts, and borders that were not drawn alike twice. Also
 * those with one region on both sides, since others may run along a spike.
 */
export function unmatchedSegments(segments: Segments): Uint32Array {
	const { count, left, right } = segments;
	let n = 0;
	const list = new Uint32Array(count);
	for (let s = 0; s < count; s++) {
		const isSpike = left[s] >= 0 && left[s] === right[s];
		if (isSpike || left[s] < 0 !== right[s] < 0) list[n++] = s;
	}
	return list.subarray(0, n);
}

/** Calls `found` for every end of an unmatched segment that lies within `tolerance` metres of another one. */
export function eachNearMiss(
	segments: Segments,
	positions: Float64Array,
	tolerance: number,
	found: (miss: NearMiss) => void,
): void {
	const unmatched = unmatchedSegments(segments);
	if (unmatched.length < 2) return;
	const index = indexOf(unmatched, segments, positions);
	const { low, high } = segments;
	for (const p of endsOf(unmatched, segments)) {
		const px = positions[2 * p];
		const py = positions[2 * p + 1];
		const { east, north } = metresPerDegree(py);
		const x = tolerance / east;
		const y = tolerance / north;
		index.search(px - x, py - y, px + x, py + y, (item) => {
			const segment = unmatched[item];
			const u = low[segment];
			const v = high[segment];
			if (u !== p && v !== p) {
				const miss = missOf(p, segment, u, v, positions, tolerance);
				if (miss) found(miss);
			}
			return false;
		});
	}
}

function missOf(
	point: number,
	segment: number,
	u: number,
	v: number,
	positions: Float64Array,
	tolerance: number,
): NearMiss | null {
	const px = positions[2 * point];
	const py = positions[2 * point + 1];
	const [ux, uy, vx, vy] = [
		positions[2 * u],
		positions[2 * u + 1],
		positions[2 * v],
		positions[2 * v + 1],
	];
	const { share, metres } = nearestOnSegment(px, py, ux, uy, vx, vy);
	if (metres > tolerance) return null;
	const toU = nearestOnSegment(px, py, ux, uy, ux, uy).metres;
	const toV = nearestOnSegment(px, py, vx, vy, vx, vy).metres;
	const nearer = toU <= toV ? u : v;
	return { point, segment, metres, end: nearer, endMetres: Math.min(toU, toV), share };
}

function indexOf(list: Uint32Array, segments: Segments, positions: Float64Array): Flatbush {
	const index = new Flatbush(list.length);
	for (const s of list) {
		const u = 2 * segments.low[s];
		const v = 2 * segments.high[s];
		const x1 = positions[u];
		const y1 = positions[u + 1];
		const x2 = positions[v];
		const y2 = positions[v + 1];
		index.add(Math.min(x1, x2), Math.min(y1, y2), Math.max(x1, x2), Math.max(y1, y2));
	}
	index.finish();
	return index;
}

function endsOf(list: Uint32Array, segments: Segments): Uint32Array {
	const ends = new Uint32Array(2 * list.length);
	list.forEach((s, i) => {
		ends[2 * i] = segments.low[s];
		ends[2 * i + 1] = segments.high[s];
	});
	ends.sort();
	let n = 0;
	for (let i = 0; i < ends.length; i++) if (i === 0 || ends[i] !== ends[i - 1]) ends[n++] = ends[i];
	return ends.subarray(0, n);
}
