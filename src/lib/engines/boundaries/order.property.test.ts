import fc from 'fast-check';
import type { Feature, Polygon } from 'geojson';
import geodesic from 'geographiclib-geodesic';
import { describe, expect, it } from 'vitest';
import {
	acceptedFeatures,
	metresOf,
	pairsOf,
	region,
} from '../../../../tests/support/read-boundaries.ts';
import { coverageFaults } from './index.ts';

/** A grid of quadrilaterals with shaken corners: neighbours by construction, also diagonally. */
function shakenGrid(size: number, shake: (i: number) => number): Feature<Polygon>[] {
	const at = (x: number, y: number) => {
		const i = 2 * (y * (size + 1) + x);
		return [x * 0.01 + shake(i) * 0.003, y * 0.01 + shake(i + 1) * 0.003];
	};
	const cells: Feature<Polygon>[] = [];
	for (let y = 0; y < size; y++) {
		for (let x = 0; x < size; x++) {
			cells.push(region(`${x}.${y}`, [at(x, y), at(x + 1, y), at(x + 1, y + 1), at(x, y + 1)]));
		}
	}
	return cells;
}

type Ring = number[][];
const withRings = (cells: Feature<Polygon>[], change: (ring: Ring, cell: number) => Ring) =>
	cells.map((cell, i) =>
		region(String(cell.id), ...cell.geometry.coordinates.map((r) => change(r.slice(0, -1), i))),
	);

const grids = fc.record({
	size: fc.integer({ min: 2, max: 5 }),
	shakes: fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 72, maxLength: 72 }),
	turn: fc.integer({ min: 1, max: 3 }),
	seed: fc.integer(),
});

const cuts = fc.array(fc.double({ min: 0.01, max: 0.99, noNaN: true }), {
	minLength: 5,
	maxLength: 40,
});

const placings = fc.record({
	east: fc.double({ min: -150, max: 150, noNaN: true }),
	north: fc.double({ min: -75, max: 75, noNaN: true }),
	scale: fc.double({ min: 0.2, max: 30, noNaN: true }),
});

async function same(cells: Feature<Polygon>[], changed: Feature<Polygon>[], digits = 6) {
	const a = await acceptedFeatures(cells);
	const b = await acceptedFeatures(changed);
	expect(coverageFaults(b.coverage)).toEqual([]);
	expect(pairsOf(b)).toEqual(pairsOf(a));
	const before = metresOf(a);
	for (const [pair, metres] of Object.entries(metresOf(b))) {
		expect(metres).toBeCloseTo(before[pair], digits);
	}
	return a;
}

const runs = { numRuns: 25 };

describe('pairs and metres are a matter of the map alone', () => {
	it('a grid of n by n has 2n(n-1) lines and 2(n-1)² points', () =>
		fc.assert(
			fc.asyncProperty(grids, async ({ size, shakes }) => {
				const read = await acceptedFeatures(shakenGrid(size, (i) => shakes[i]));
				const kinds = pairsOf(read).map((pair) => pair.split(' ')[1]);
				expect(kinds.filter((kind) => kind === 'line')).toHaveLength(2 * size * (size - 1));
				expect(kinds.filter((kind) => kind === 'point')).toHaveLength(2 * (size - 1) ** 2);
			}),
			runs,
		));
	it('not of the order of features', () =>
		fc.assert(
			fc.asyncProperty(grids, async ({ size, shakes, turn }) => {
				const cells = shakenGrid(size, (i) => shakes[i]);
				const other = [...cells.slice(turn), ...cells.slice(0, turn)].reverse();
				await same(cells, other);
			}),
			runs,
		));
	it('not of the first corner or the direction of an outline', () =>
		fc.assert(
			fc.asyncProperty(grids, async ({ size, shakes, turn }) => {
				const cells = shakenGrid(size, (i) => shakes[i]);
				const turned = withRings(cells, (ring, i) => {
					const moved = [...ring.slice(turn), ...ring.slice(0, turn)];
					return i % 2 ? moved.reverse() : moved;
				});
				await same(cells, turned);
			}),
			runs,
		));
	it('not of corners added along the edges of one side', () =>
		fc.assert(
			fc.asyncProperty(grids, async ({ size, shakes }) => {
				const cells = shakenGrid(size, (i) => shakes[i]);
				const halved = withRings(cells, (ring, i) =>
					i % 2 ? ring : ring.flatMap((p, k) => [p, middle(p, ring[(k + 1) % ring.length])]),
				);
				await same(cells, halved, 3);
			}),
			runs,
		));
	it('not of any number of corners added along any edges', () =>
		fc.assert(
			fc.asyncProperty(grids, cuts, async ({ size, shakes }, shares) => {
				const cells = shakenGrid(size, (i) => shakes[i]);
				let next = 0;
				const cut = withRings(cells, (ring) =>
					ring.flatMap((p, k) => {
						const count = Math.floor(shares[next++ % shares.length] * 4);
						const along = Array.from({ length: count }, () => shares[next++ % shares.length]);
						const q = ring[(k + 1) % ring.length];
						return [p, ...along.sort((a, b) => a - b).map((share) => between(p, q, share))];
					}),
				);
				await same(cells, cut, 3);
			}),
			runs,
		));
	it('and the metres are those of the geodesics, wherever the map lies and however large it is', () =>
		fc.assert(
			fc.asyncProperty(grids, placings, async ({ size, shakes }, { east, north, scale }) => {
				const cells = withRings(
					shakenGrid(size, (i) => shakes[i]),
					(ring) => ring.map(([x, y]) => [x * scale + east, y * scale + north]),
				);
				const there = await acceptedFeatures(cells);
				const here = await acceptedFeatures(shakenGrid(size, (i) => shakes[i]));
				expect(pairsOf(there)).toEqual(pairsOf(here));
				const metres = metresOf(there);
				for (const [pair, [p, q]] of sharedEdges(cells)) {
					// C. F. F. Karney's library, which the engine asks only above 10 km
					const { s12 } = geodesic.Geodesic.WGS84.Inverse(p[1], p[0], q[1], q[0]);
					expect(Math.abs(metres[pair] / (s12 as number) - 1)).toBeLessThan(1e-6);
				}
			}),
			runs,
		));
	it('not of the place east or west', () =>
		fc.assert(
			fc.asyncProperty(grids, async ({ size, shakes }) => {
				const cells = shakenGrid(size, (i) => shakes[i]);
				for (const east of [100, 179.98, -179.99, 359]) {
					const moved = withRings(cells, (ring) =>
						ring.map(([x, y]) => [x + east > 180 && east < 300 ? x + east - 360 : x + east, y]),
					);
					await same(cells, moved, 2);
				}
			}),
			{ numRuns: 8 },
		));
});

const between = (p: number[], q: number[], share: number) => [
	p[0] + share * (q[0] - p[0]),
	p[1] + share * (q[1] - p[1]),
];
const middle = (p: number[], q: number[]) => between(p, q, 0.5);

/** The edge that each two neighbouring cells have in common, by the names of both. */
function sharedEdges(cells: Feature<Polygon>[]): Map<string, [number[], number[]]> {
	const owners = new Map<string, string>();
	const shared = new Map<string, [number[], number[]]>();
	for (const cell of cells) {
		const [ring] = cell.geometry.coordinates;
		ring.slice(1).forEach((q, i) => {
			const code = [ring[i], q].map(String).sort().join(' ');
			const other = owners.get(code);
			if (other) shared.set([other, String(cell.id)].sort().join('-'), [ring[i], q]);
			else owners.set(code, String(cell.id));
		});
	}
	return shared;
}
