/**
 * Numbers of the points (interleaved coordinates) that make up the convex hull, anticlockwise, without
 * points on its sides. Andrew, "Another efficient algorithm for convex hulls in two dimensions" (1979).
 */
export function hullOf(points: Float64Array, count: number): number[] {
	const order = Array.from({ length: count }, (_, p) => p);
	order.sort((p, q) => points[2 * p] - points[2 * q] || points[2 * p + 1] - points[2 * q + 1]);
	if (count < 3) return order;
	const lower = half(points, order);
	const upper = half(points, order.reverse());
	return [...lower.slice(0, -1), ...upper.slice(0, -1)];
}

function half(points: Float64Array, order: number[]): number[] {
	const hull: number[] = [];
	for (const p of order) {
		while (hull.length >= 2 && turn(points, hull[hull.length - 2], hull[hull.length - 1], p) <= 0) {
			hull.pop();
		}
		hull.push(p);
	}
	return hull;
}

function turn(points: Float64Array, p: number, q: number, r: number): number {
	return (
		(points[2 * q] - points[2 * p]) * (points[2 * r + 1] - points[2 * p + 1]) -
		(points[2 * q + 1] - points[2 * p + 1]) * (points[2 * r] - points[2 * p])
	);
}
