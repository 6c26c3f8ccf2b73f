/**
 * Where two segments cross, as shares of the way along each, or null. Only proper crossings count: a
 * shared end, an end on the other segment or parallel segments are none. Doubles, so within rounding of
 * touching the answer may go either way.
 */
export function crossing(
	p: Float64Array,
	i: number,
	q: Float64Array,
	j: number,
): [number, number] | null {
	const px = p[2 * i];
	const py = p[2 * i + 1];
	const qx = q[2 * j];
	const qy = q[2 * j + 1];
	const rx = p[2 * i + 2] - px;
	const ry = p[2 * i + 3] - py;
	const sx = q[2 * j + 2] - qx;
	const sy = q[2 * j + 3] - qy;
	const cross = rx * sy - ry * sx;
	if (cross === 0) return null;
	const t = ((qx - px) * sy - (qy - py) * sx) / cross;
	const u = ((qx - px) * ry - (qy - py) * rx) / cross;
	return t > 0 && t < 1 && u > 0 && u < 1 && !sharesEnd(p, i, q, j) ? [t, u] : null;
}

function sharesEnd(p: Float64Array, i: number, q: Float64Array, j: number): boolean {
	const same = (a: number, b: number) => p[2 * a] === q[2 * b] && p[2 * a + 1] === q[2 * b + 1];
	return same(i, j) || same(i, j + 1) || same(i + 1, j) || same(i + 1, j + 1);
}
