import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sideBy, turnOf } from './exact-side.ts';

const whole = fc.integer({ min: -(2 ** 50), max: 2 ** 50 });
const small = fc.integer({ min: -3, max: 3 });
const point = fc.oneof(fc.tuple(whole, whole), fc.tuple(small, small));
type Point = [number, number];

/** The same by whole numbers alone. */
function exactTurn([ax, ay]: Point, [bx, by]: Point, [cx, cy]: Point): number {
	const [a, b, c, d] = [bx - ax, cy - ay, by - ay, cx - ax].map(BigInt);
	const turn = a * b - c * d;
	return turn > 0n ? 1 : turn < 0n ? -1 : 0;
}

describe('the side of a line', () => {
	it('has the exact sign', () => {
		fc.assert(
			fc.property(point, point, point, (a, b, c) => {
				expect(Math.sign(turnOf(...a, ...b, ...c)) + 0).toBe(exactTurn(a, b, c));
			}),
		);
	});
	it('is exact for points that are all but on the line', () => {
		fc.assert(
			fc.property(whole, whole, fc.integer({ min: 1, max: 1000 }), small, (x, y, by, off) => {
				const [a, b]: Point[] = [
					[0, 0],
					[Math.trunc(x / 2000), Math.trunc(y / 2000)],
				];
				const c: Point = [b[0] * by + off, b[1] * by];
				expect(Math.sign(turnOf(...a, ...b, ...c)) + 0).toBe(exactTurn(a, b, c));
			}),
		);
	});
	it('on the line is told by a small step, and the other way round by the step back', () => {
		fc.assert(
			fc.property(small, small, (dx, dy) => {
				fc.pre(dx !== 0 || dy !== 0);
				const e = 1e-4;
				const stepped = Math.sign(dx * e * e - dy * e);
				expect(sideBy(0, dx, dy, 1)).toBe(stepped);
				expect(sideBy(0, dx, dy, -1)).toBe(-stepped);
				expect(sideBy(7, dx, dy, -1)).toBe(1);
			}),
		);
	});
});
