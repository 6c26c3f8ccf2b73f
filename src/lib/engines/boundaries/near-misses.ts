import { metresPerDegree } from '../geometry/ellipsoid.ts';
import { nearestOnSegment } from '../geometry/near.ts';
import { SegmentRuns } from './segment-runs.ts';
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

/**
 * Calls `found` for every end of an unmatched segment that lies within `tolerance` metres of another one.
 * Segments are looked up in runs, which mostly follow an outline, so that few boxes have to be searched. With
 * `changed`, only segments with an end among these vertices are measured.
 */
export function eachNearMiss(
	segments: Segments,
	positions: Float64Array,
	tolerance: number,
	found: (miss: NearMiss) => void,
	changed: Uint8Array | null = null,
): void {
	const unmatched = unmatchedSegments(segments);
	if (unmatched.length < 2) return;
	const { low, high } = segments;
	const runs = new SegmentRuns(unmatched, segments, positions, changed);
	const seen = new Uint8Array(positions.length / 2);
	let p = 0;
	const measure = (segment: number) => {
		const u = low[segment];
		const v = high[segment];
		if (u === p || v === p || (changed && !changed[u] && !changed[v])) return;
		const miss = missOf(p, segment, u, v, positions, tolerance);
		if (miss) found(miss);
	};
	for (const [from, to] of runs.runs()) {
		const { east, north } = metresPerDegree(runs.mostNorth(from));
		const dx = tolerance / east;
		const dy = (tolerance / north) * 1.01;
		const near = runs.near(from, dx, dy);
		if (near.length === 0) continue;
		for (let i = 2 * from; i < 2 * to; i++) {
			p = (i & 1 ? high : low)[unmatched[i >> 1]];
			if (seen[p]) continue;
			seen[p] = 1;
			for (const run of near) {
				runs.around(run, positions[2 * p], positions[2 * p + 1], dx, dy, measure);
			}
		}
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
