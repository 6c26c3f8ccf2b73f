import { metresPerDegree } from './ellipsoid.ts';

/** Where on a segment the nearest place to a point is: share of the way (0 to 1) and metres away. */
export interface Nearest {
	share: number;
	metres: number;
}

/**
 * The place on the straight segment u-v nearest to p, in a plane laid on the ellipsoid at p. Positions are
 * degrees; good to a thousandth of the distance for distances of a few kilometres.
 */
export function nearestOnSegment(
	px: number,
	py: number,
	ux: number,
	uy: number,
	vx: number,
	vy: number,
): Nearest {
	const { east, north } = metresPerDegree(py);
	const ax = (ux - px) * east;
	const ay = (uy - py) * north;
	const dx = (vx - ux) * east;
	const dy = (vy - uy) * north;
	const length2 = dx * dx + dy * dy;
	const share = length2 === 0 ? 0 : Math.max(0, Math.min(1, -(ax * dx + ay * dy) / length2));
	return { share, metres: Math.hypot(ax + share * dx, ay + share * dy) };
}
