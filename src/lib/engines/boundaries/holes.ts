import { sweptKm2 } from '../geometry/areas.ts';
import type { Coverage } from '../geometry/coverage.ts';
import { doubleArea } from '../geometry/rings.ts';
import { SegmentBlocks } from '../geometry/segment-blocks.ts';
import { traceRings } from './arc-rings.ts';
import type { Arcs } from './arcs.ts';
import { pointsOf } from './traced-ring.ts';

/** Nobody's land enclosed by two or more regions. */
export interface Hole {
	/** regions around it */
	regions: number[];
	km2: number;
	/** twice the area by the length of its outline */
	meanMetres: number;
	at: [number, number];
}

/** How far inside a hole it is looked up, in degrees: a tenth of a millimetre. */
const inside = 1e-9;

/**
 * The holes of a coverage that lie between regions, largest first: arcs with nobody on one side, walked
 * with nobody on the left, that come round anticlockwise. With `overlapping`, what another region covers
 * is none.
 */
export function holesBetween(coverage: Coverage, arcs: Arcs, overlapping: boolean): Hole[] {
	const halves: number[] = [];
	for (let a = 0; a < arcs.left.length; a++) {
		if (arcs.left[a] < 0) halves.push(a);
		else if (arcs.right[a] < 0) halves.push(~a);
	}
	const blocks = overlapping ? new SegmentBlocks(coverage) : null;
	const holes: Hole[] = [];
	for (const ring of traceRings(Int32Array.from(halves), arcs)) {
		const regions = new Set(ring.map((half) => ownerOf(arcs, half)));
		if (regions.size < 2) continue;
		const points = closed(pointsOf(ring, arcs));
		if (doubleArea(points, 0, points.length / 2 - 1) <= 0) continue;
		const place = besideLongest(points);
		if (blocks && blocks.regionsAt(...place).length > 0) continue;
		const km2 = sweptKm2(points, 0, points.length / 2 - 1);
		const metres = ring.reduce((sum, half) => sum + coverage.arcMetres[numberOf(half)], 0);
		const sorted = [...regions].sort((a, b) => a - b);
		holes.push({ regions: sorted, km2, meanMetres: (2e6 * km2) / metres, at: place });
	}
	return holes.sort((a, b) => b.km2 - a.km2);
}

const numberOf = (half: number) => (half >= 0 ? half : ~half);

const ownerOf = (arcs: Arcs, half: number) => (half >= 0 ? arcs.right[half] : arcs.left[~half]);

/** With the first point again at the end. */
function closed(points: Float64Array): Float64Array {
	const all = new Float64Array(points.length + 2);
	all.set(points);
	all.set(points.subarray(0, 2), points.length);
	return all;
}

/** Just left of the middle of the longest edge. */
function besideLongest(points: Float64Array): [number, number] {
	let [best, longest] = [0, -1];
	for (let i = 0; i + 3 < points.length; i += 2) {
		const length = Math.hypot(points[i + 2] - points[i], points[i + 3] - points[i + 1]);
		if (length > longest) [best, longest] = [i, length];
	}
	const [x1, y1, x2, y2] = points.subarray(best, best + 4);
	return [
		(x1 + x2) / 2 - ((y2 - y1) / longest) * inside,
		(y1 + y2) / 2 + ((x2 - x1) / longest) * inside,
	];
}
