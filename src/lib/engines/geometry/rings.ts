/** Twice the signed area of a closed line of interleaved points, in squared degrees; anticlockwise is positive. */
export function doubleArea(points: Float64Array, from: number, to: number): number {
	const x0 = points[2 * from];
	const y0 = points[2 * from + 1];
	let sum = 0;
	for (let i = from; i < to; i++) {
		const j = i + 1 === to ? from : i + 1;
		sum +=
			(points[2 * i] - x0) * (points[2 * j + 1] - y0) -
			(points[2 * j] - x0) * (points[2 * i + 1] - y0);
	}
	return sum;
}

/** 1 inside, 0 on a vertex or an edge, -1 outside a closed line of interleaved points `from` to `to`. */
export function sideOfRing(
	points: Float64Array,
	from: number,
	to: number,
	x: number,
	y: number,
): -1 | 0 | 1 {
	let inside = false;
	for (let i = from, j = to - 1; i < to; j = i++) {
		const xi = points[2 * i];
		const yi = points[2 * i + 1];
		const xj = points[2 * j];
		const yj = points[2 * j + 1];
		const turn = (xj - xi) * (y - yi) - (x - xi) * (yj - yi);
		if (turn === 0 && within(x, xi, xj) && within(y, yi, yj)) return 0;
		if (yi > y !== yj > y && turn < 0 === yj < yi) inside = !inside;
	}
	return inside ? 1 : -1;
}

const within = (v: number, a: number, b: number) => v >= Math.min(a, b) && v <= Math.max(a, b);
