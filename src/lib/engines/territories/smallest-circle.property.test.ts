import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { hullOf } from './hull.ts';
import { smallestCircle } from './smallest-circle.ts';

const points = fc
	.array(fc.tuple(fc.integer({ min: -9, max: 9 }), fc.integer({ min: -9, max: 9 })), {
		minLength: 1,
		maxLength: 12,
	})
	.map((list) => Float64Array.from(list.flat()));

/** The smallest of all circles on two or three of the points that hold them all. */
function bruteRadius(given: Float64Array): number {
	const list = Array.from({ length: given.length / 2 }, (_, i) => [given[2 * i], given[2 * i + 1]]);
	const holds = (x: number, y: number, r: number) =>
		list.every(([px, py]) => Math.hypot(px - x, py - y) <= r + 1e-9);
	let best = list.every(([x, y]) => x === list[0][0] && y === list[0][1]) ? 0 : Infinity;
	const offer = (x: number, y: number, r: number) => {
		if (r < best && holds(x, y, r)) best = r;
	};
	for (const [ax, ay] of list) {
		for (const [bx, by] of list) {
			offer((ax + bx) / 2, (ay + by) / 2, Math.hypot(ax - bx, ay - by) / 2);
			for (const [cx, cy] of list) {
				// where the perpendicular bisectors of two sides meet, by Cramer's rule
				const d = 2 * (ax * (by - cy) + bx * (cy - ay) + cx * (ay - by));
				if (d === 0) continue;
				const [a2, b2, c2] = [ax * ax + ay * ay, bx * bx + by * by, cx * cx + cy * cy];
				const x = (a2 * (by - cy) + b2 * (cy - ay) + c2 * (ay - by)) / d;
				const y = (a2 * (cx - bx) + b2 * (ax - cx) + c2 * (bx - ax)) / d;
				offer(x, y, Math.hypot(x - ax, y - ay));
			}
		}
	}
	return best;
}

describe('the smallest circle', () => {
	it('is that of all pairs and triples, on a lattice full of ties', () => {
		fc.assert(
			fc.property(points, (given) => {
				const circle = smallestCircle(given, given.length / 2);
				expect(circle?.radius).toBeCloseTo(bruteRadius(given), 9);
			}),
			{ numRuns: 500 },
		);
	});

	it('needs the corners of the convex hull only', () => {
		fc.assert(
			fc.property(points, (given) => {
				const hull = hullOf(given, given.length / 2);
				const corners = Float64Array.from(hull.flatMap((p) => [given[2 * p], given[2 * p + 1]]));
				const all = smallestCircle(given, given.length / 2);
				expect(smallestCircle(corners, hull.length)?.radius).toBeCloseTo(all?.radius ?? NaN, 9);
			}),
			{ numRuns: 500 },
		);
	});

	it('of no points is none', () => {
		expect(smallestCircle(new Float64Array(0), 0)).toBeNull();
	});
});
