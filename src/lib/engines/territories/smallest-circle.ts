export interface Circle {
	x: number;
	y: number;
	radius: number;
}

const margin = 1 + 1e-12;

/**
 * The smallest circle around the first `count` points (interleaved), null for none.
 *
 * The circle is held by two or three points; as long as a point lies outside, the farthest one joins them
 * and the smallest circle around these few is taken. It grows at every step, so it ends: Welzl, "Smallest
 * enclosing disks" (1991) with the choice of Gaertner, "Fast and robust smallest enclosing balls" (1999).
 * A handful of rounds over the points; the radius is right to about 1e-12 of itself.
 */
export function smallestCircle(points: Float64Array, count: number): Circle | null {
	if (count === 0) return null;
	let held = [0];
	let circle: Circle = { x: points[0], y: points[1], radius: 0 };
	for (let round = 0; round < 1000; round++) {
		const far = farthest(points, count, circle);
		if (within(points, far, circle)) return circle;
		const next = around(points, held, far);
		if (!(next.circle.radius > circle.radius)) return circle;
		({ held, circle } = next);
	}
	return circle;
}

function farthest(points: Float64Array, count: number, { x, y }: Circle): number {
	let best = 0;
	let most = -1;
	for (let p = 0; p < count; p++) {
		const [dx, dy] = [points[2 * p] - x, points[2 * p + 1] - y];
		const far = dx * dx + dy * dy;
		if (far > most) [best, most] = [p, far];
	}
	return best;
}

function within(points: Float64Array, p: number, { x, y, radius }: Circle): boolean {
	return Math.hypot(points[2 * p] - x, points[2 * p + 1] - y) <= radius * margin;
}

/** The smallest circle around up to three points and one outside their circle, which is on its rim. */
function around(
	points: Float64Array,
	held: number[],
	far: number,
): { held: number[]; circle: Circle } {
	let best: { held: number[]; circle: Circle } | null = null;
	const offer = (rim: number[], circle: Circle | null) => {
		if (!circle || (best && circle.radius >= best.circle.radius)) return;
		if (held.every((p) => within(points, p, circle))) best = { held: rim, circle };
	};
	held.forEach((p, i) => {
		offer([far, p], onTwo(points, far, p));
		for (const q of held.slice(i + 1)) offer([far, p, q], onThree(points, far, p, q));
	});
	return best ?? { held, circle: { x: 0, y: 0, radius: 0 } };
}

function onTwo(points: Float64Array, p: number, q: number): Circle {
	const x = (points[2 * p] + points[2 * q]) / 2;
	const y = (points[2 * p + 1] + points[2 * q + 1]) / 2;
	return { x, y, radius: Math.hypot(points[2 * p] - x, points[2 * p + 1] - y) };
}

function onThree(points: Float64Array, p: number, q: number, r: number): Circle | null {
	const [ox, oy] = [points[2 * p], points[2 * p + 1]];
	const [bx, by] = [points[2 * q] - ox, points[2 * q + 1] - oy];
	const [cx, cy] = [points[2 * r] - ox, points[2 * r + 1] - oy];
	const twice = 2 * (bx * cy - by * cx);
	if (twice === 0) return null;
	const [b2, c2] = [bx * bx + by * by, cx * cx + cy * cy];
	const [dx, dy] = [(cy * b2 - by * c2) / twice, (bx * c2 - cx * b2) / twice];
	// the largest of the three distances, so that rounding leaves none of the points outside
	const radius = Math.max(
		Math.hypot(dx, dy),
		Math.hypot(dx - bx, dy - by),
		Math.hypot(dx - cx, dy - cy),
	);
	return { x: ox + dx, y: oy + dy, radius };
}
