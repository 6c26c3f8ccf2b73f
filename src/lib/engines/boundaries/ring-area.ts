import { sweptKm2 } from '../geometry/areas.ts';

/** Area in km² of a ring whose first point is not repeated; clockwise rings count as less than nothing. */
export function ringKm2(points: Float64Array): number {
	const closed = new Float64Array(points.length + 2);
	closed.set(points);
	closed.set(points.subarray(0, 2), points.length);
	return sweptKm2(closed, 0, points.length / 2);
}
