import { karneyMetres, metresPerDegree } from '../geometry/ellipsoid.ts';

/**
 * About how far a point is from the straight segment u-v, and where: in a plane at the latitude half way
 * between them. Off by a few parts in ten thousand at 100 km, less nearby; good for choosing.
 */
export function roughNearest(
	px: number,
	py: number,
	ux: number,
	uy: number,
	vx: number,
	vy: number,
): { share: number; metres: number } {
	const level = Math.max(Math.min(py, Math.max(uy, vy)), Math.min(uy, vy));
	const { east, north } = metresPerDegree((py + level) / 2);
	const [ax, ay] = [(ux - px) * east, (uy - py) * north];
	const [dx, dy] = [(vx - ux) * east, (vy - uy) * north];
	const length2 = dx * dx + dy * dy;
	const share = length2 === 0 ? 0 : Math.max(0, Math.min(1, -(ax * dx + ay * dy) / length2));
	return { share, metres: Math.hypot(ax + share * dx, ay + share * dy) };
}

const golden = (Math.sqrt(5) - 1) / 2;
const window = 0.05;

/**
 * Metres along the ellipsoid (Karney 2013) from a point to the nearest place of a segment, by golden
 * section search (Kiefer 1953) about a rough share of the way.
 */
export function geodesicNearest(
	px: number,
	py: number,
	ux: number,
	uy: number,
	vx: number,
	vy: number,
	rough: number,
): { x: number; y: number; metres: number } {
	const at = (share: number) => {
		const [x, y] = [ux + share * (vx - ux), uy + share * (vy - uy)];
		return { x, y, metres: karneyMetres(px, py, x, y) };
	};
	let [low, high] = [Math.max(0, rough - window), Math.min(1, rough + window)];
	let best = [at(0), at(1), at(rough)].reduce((p, q) => (q.metres < p.metres ? q : p));
	for (let step = 0; step < 40; step++) {
		const span = golden * (high - low);
		const [left, right] = [at(high - span), at(low + span)];
		for (const tried of [left, right]) if (tried.metres < best.metres) best = tried;
		if (left.metres <= right.metres) high = low + span;
		else low = high - span;
	}
	return best;
}
