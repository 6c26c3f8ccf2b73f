import fc from 'fast-check';
import geodesic from 'geographiclib-geodesic';
import { describe, expect, it } from 'vitest';
import { bytesOf, worldAtlas } from '../../../../tests/support/atlas.ts';
import {
	accepted,
	acceptedFeatures,
	box,
	collection,
	region,
} from '../../../../tests/support/read-boundaries.ts';
import type { Coverage } from '../geometry/index.ts';
import { gapsWithin } from './index.ts';

const inverse = (x1: number, y1: number, x2: number, y2: number) =>
	geodesic.Geodesic.WGS84.Inverse(y1, x1, y2, x2).s12 as number;

/** Least distance from a point to a straight segment, by a fine walk and then a search by thirds. */
function toSegment(p: number[], u: number[], v: number[]): number {
	const at = (t: number) => inverse(p[0], p[1], u[0] + t * (v[0] - u[0]), u[1] + t * (v[1] - u[1]));
	const steps = 64;
	let best = 0;
	for (let i = 0; i <= steps; i++) if (at(i / steps) < at(best / steps)) best = i;
	let [low, high] = [Math.max(0, best - 1) / steps, Math.min(steps, best + 1) / steps];
	for (let i = 0; i < 60; i++) {
		const third = (high - low) / 3;
		if (at(low + third) < at(high - third)) high -= third;
		else low += third;
	}
	return Math.min(at((low + high) / 2), at(0), at(1));
}

/** Every corner of either ring against every edge of the other, all by geographiclib. */
function bruteGap(one: number[][], two: number[][]): number {
	let least = Infinity;
	for (const [corners, edges] of [
		[one, two],
		[two, one],
	]) {
		for (const p of corners) {
			edges.forEach((u, i) => {
				least = Math.min(least, toSegment(p, u, edges[(i + 1) % edges.length]));
			});
		}
	}
	return least;
}

const keyed = (coverage: Coverage, gaps: ReturnType<typeof gapsWithin>) =>
	Object.fromEntries(
		Array.from(gaps.a, (a, i) => [
			[coverage.keys[a], coverage.keys[gaps.b[i]]].sort().join('-'),
			gaps.metres[i],
		]),
	);

const blob = (x: number, y: number, size: number, radii: number[]) =>
	radii.map((r, i) => {
		const turn = (2 * Math.PI * i) / radii.length;
		return [x + size * r * Math.cos(turn), y + size * r * Math.sin(turn)];
	});

describe('gaps between coasts', () => {
	it('are as wide as geographiclib finds them, corner by edge, to a millionth', () =>
		fc.assert(
			fc.asyncProperty(
				fc.array(fc.double({ min: 0.3, max: 1, noNaN: true }), { minLength: 16, maxLength: 16 }),
				fc.double({ min: -75, max: 75, noNaN: true }),
				fc.double({ min: 0.001, max: 0.4, noNaN: true }),
				async (radii, lat, size) => {
					const one = blob(10, lat, size, radii.slice(0, 8));
					const two = blob(10 + 2.3 * size, lat + 0.4 * size, size, radii.slice(8));
					const { coverage, borders } = await acceptedFeatures([
						region('p', one),
						region('q', two),
					]);
					const gaps = gapsWithin(coverage, 200, borders);
					const width = keyed(coverage, gaps)['p-q'];
					expect(gaps.withinKm).toBe(200);
					expect(Math.abs(width / bruteGap(one, two) - 1)).toBeLessThan(1e-6);
				},
			),
			{ numRuns: 12 },
		));
	it('are found across the 180th meridian of a whole world', async () => {
		const map = [
			box('w', 175, 0, 179.9, 1),
			box('e', -179.9, 0, -170, 1),
			box('bridge', -160, 40, 165, 41),
			...[-150, -100, -50, 0, 50, 100].map((x) => box(`${x}`, x, -60, x + 50, -59)),
			box('last', 150, -60, 180, -59),
			box('first', -180, -60, -150, -59),
		];
		const { coverage, borders } = await acceptedFeatures(map);
		const widths = keyed(coverage, gapsWithin(coverage, 30, borders));
		expect(widths['e-w']).toBeCloseTo(inverse(179.9, 1, -179.9, 1), 3);
		expect(widths).not.toHaveProperty('first-last');
	});
	it('leave out pairs that touch, and say how far they looked when the work runs out', async () => {
		const map = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1), box('c', 2.01, 0, 3, 1)];
		const { coverage, borders } = await acceptedFeatures(map, { acrossWaterKm: 5 });
		const all = gapsWithin(coverage, 5, borders);
		expect(Object.keys(keyed(coverage, all))).toEqual(['b-c']);
		const short = gapsWithin(coverage, 5, borders, 1);
		expect(short.withinKm).toBeLessThan(1.1);
		expect(short.a).toHaveLength(0);
	});
	it('the Strait of Dover is some 33 km wide', async () => {
		// 18 nautical miles from South Foreland to Cap Gris-Nez (from memory); the map is Natural Earth's
		// at 1:10 million, drawn to about a kilometre.
		const world = worldAtlas('10m');
		const two = ['250', '826', '056'];
		const few = collection(world.features.filter((f) => two.includes(String(f.id))));
		const { coverage, borders } = await accepted(bytesOf(few));
		const widths = keyed(coverage, gapsWithin(coverage, 40, borders));
		expect(widths['250-826'] / 1000).toBeGreaterThan(32);
		expect(widths['250-826'] / 1000).toBeLessThan(35);
	});
});
