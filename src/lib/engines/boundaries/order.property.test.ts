import fc from 'fast-check';
import type { Feature, Polygon } from 'geojson';
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

const middle = (p: number[], q: number[]) => [(p[0] + q[0]) / 2, (p[1] + q[1]) / 2];
