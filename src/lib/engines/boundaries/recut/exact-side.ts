/**
 * On which side of a line a point lies, never undecided: one of two drawings is taken to stand an
 * infinitely small step beside the other, the step (e, e * e), so that no point of one lies on a line of
 * the other. Method: simulation of simplicity (Edelsbrunner and Mücke 1990), for a common shift; filter
 * of Shewchuk (1997), "Adaptive precision floating-point arithmetic", with whole numbers behind it.
 */

/** 3 + 16e by e = 2 ** -53: Shewchuk's bound for the sign of a 2 by 2 determinant of differences. */
const filter = (3 + 16 * 2 ** -53) * 2 ** -53;

/**
 * Twice the area of the triangle a, b, c, positive when c lies left of a to b. In: whole numbers below
 * 2 ** 51. The sign is exact, and so is 0.
 */
export function turnOf(
	ax: number,
	ay: number,
	bx: number,
	by: number,
	cx: number,
	cy: number,
): number {
	const one = (bx - ax) * (cy - ay);
	const other = (by - ay) * (cx - ax);
	const turn = one - other;
	if (Math.abs(turn) > filter * (Math.abs(one) + Math.abs(other))) return turn;
	if (one === 0 && other === 0) return 0;
	return Number(BigInt(bx - ax) * BigInt(cy - ay) - BigInt(by - ay) * BigInt(cx - ax));
}

/**
 * Sign of a turn, or where it is 0 that of moving the point by `step` times (e, e * e) off a line that
 * runs along (dx, dy), which is no single point. `step` is 1 or -1.
 */
export function sideBy(turn: number, dx: number, dy: number, step: number): number {
	if (turn !== 0) return Math.sign(turn);
	return step * (dy !== 0 ? -Math.sign(dy) : Math.sign(dx));
}
