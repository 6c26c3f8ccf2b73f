import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bentCells, dissolved, landOf } from '../../../../tests/support/recut-lands.ts';
import { acceptedFeatures, box } from '../../../../tests/support/read-boundaries.ts';
import { edgeNeighbours, type EdgeNeighbours } from './edge-neighbours.ts';
import type { Coverage } from './coverage.ts';

const [rows, columns] = [5, 6];
const moves = fc.array(
	fc.integer({ min: -100, max: 100 }).map((v) => v / 100),
	{
		minLength: 20,
		maxLength: 40,
	},
);
/** which region each cell belongs to, and which sheet */
const owners = fc.array(fc.nat(7), { minLength: rows * columns, maxLength: rows * columns });
const sides = fc.array(fc.nat(1), { minLength: rows * columns, maxLength: rows * columns });

const name = (owner: number) => `region ${owner}`;

function groups(owned: number[], cells: number[]): Record<string, number[]> {
	const regions: Record<string, number[]> = {};
	for (const cell of cells) (regions[name(owned[cell])] ??= []).push(cell);
	return regions;
}

/** Pairs by key that cells next to each other in the grid make, of a cell of one sheet and one of the other. */
function pairsOfCells(owned: number[], side: number[]): Set<string> {
	const pairs = new Set<string>();
	const look = (p: number, q: number) => {
		if (side[p] === side[q]) return;
		const [a, b] = side[p] === 0 ? [p, q] : [q, p];
		pairs.add(`${name(owned[a])} | ${name(owned[b])}`);
	};
	for (let cell = 0; cell < rows * columns; cell++) {
		if ((cell + 1) % columns !== 0) look(cell, cell + 1);
		if (cell + columns < rows * columns) look(cell, cell + columns);
	}
	return pairs;
}

const told = (a: Coverage, b: Coverage, found: EdgeNeighbours) => {
	const pair = (p: number, q: number) => `${a.keys[p]} | ${b.keys[q]}`;
	const lines = found.beside.filter(({ metres }) => metres > 0);
	return [...lines.map((one) => pair(one.a, one.b)), ...found.same.map(([p, q]) => pair(p, q))];
};

async function found(a: Coverage, b: Coverage, toleranceMetres?: number): Promise<EdgeNeighbours> {
	const result = await edgeNeighbours(a, b, { toleranceMetres });
	if (result.status !== 'found') throw new Error(result.message);
	return result;
}

describe('a land cut in two', () => {
	it('has across the cut the borders that its cells have, through regions and between them', async () => {
		await fc.assert(
			fc.asyncProperty(moves, owners, sides, async (bent, owned, side) => {
				const all = owned.map((_, cell) => cell);
				const [west, east] = [0, 1].map((one) => all.filter((cell) => side[cell] === one));
				fc.pre(west.length > 0 && east.length > 0);
				const cells = bentCells(rows, columns, bent);
				const a = await landOf(cells, groups(owned, west));
				const b = await landOf(cells, groups(owned, east));
				const expected = pairsOfCells(owned, side);
				// regions in pieces that lie apart can have one key and the same box without touching
				const touching = told(a, b, await found(a, b)).filter((pair) => {
					const [p, q] = pair.split(' | ');
					return p !== q || expected.has(pair);
				});
				expect(new Set(touching)).toEqual(expected);
			}),
			{ numRuns: 60 },
		);
	});

	it('keeps apart the halves of a region that reach as far as each other', async () => {
		// a comb: both halves of `cut` reach over the whole land, `other` lies beside one of them
		const owned = Array.from({ length: rows * columns }, (_, cell) => (cell === 1 ? 1 : 0));
		const side = owned.map((_, cell) => (cell % columns) % 2);
		const cells = bentCells(rows, columns, [0]);
		const all = owned.map((_, cell) => cell);
		const half = (one: number) =>
			groups(
				owned,
				all.filter((cell) => side[cell] === one),
			);
		const [a, b] = [await landOf(cells, half(0)), await landOf(cells, half(1))];
		const pairs = new Set(told(a, b, await found(a, b)));
		expect(pairs).toEqual(new Set(['region 0 | region 0', 'region 0 | region 1']));
	});

	it('has the metres that the whole land has', async () => {
		const bent = [0.3, -0.7, 0.9, 0.1, -0.4, 0.6, -0.2];
		const cells = bentCells(rows, columns, bent);
		const all = cells.map((_, cell) => cell);
		const own = Object.fromEntries(all.map((cell) => [`c${cell}`, [cell]]));
		const inWest = (cell: number) => cell % columns < 3;
		const part = (wanted: boolean) =>
			Object.fromEntries(Object.entries(own).filter(([, [cell]]) => inWest(cell) === wanted));
		const { borders, coverage } = await acceptedFeatures(dissolved(cells, own));
		const across = new Map<string, number>();
		borders.a.forEach((a, i) => {
			const [p, q] = [coverage.keys[a], coverage.keys[borders.b[i]]];
			if (inWest(own[p][0]) === inWest(own[q][0])) return;
			const key = inWest(own[p][0]) ? `${p} ${q}` : `${q} ${p}`;
			across.set(key, borders.metres[i]);
		});
		const a = await landOf(cells, part(true));
		const b = await landOf(cells, part(false));
		const { beside, same } = await found(a, b);
		expect(same).toEqual([]);
		expect(beside).toHaveLength(across.size);
		for (const pair of beside) {
			const metres = across.get(`${a.keys[pair.a]} ${b.keys[pair.b]}`) ?? NaN;
			expect(pair.metres).toBeCloseTo(metres, 6);
		}
	});
});

describe('edges drawn by two hands', () => {
	const west = () => acceptedFeatures([box('w1', 10, 45, 11, 46), box('w2', 10, 46, 11, 48)]);

	it('match where one has corners that the other has not, and where they run apart a little', async () => {
		const { coverage: a } = await west();
		// a corner in the middle of w1, another one metre off the line, none at 46 degrees
		const ring = [
			[11, 45],
			[12, 45],
			[12, 47],
			[11.000013, 47],
			[11, 45.5],
			[11, 45],
		];
		const e1 = {
			...box('e1', 0, 0, 1, 1),
			geometry: { type: 'Polygon' as const, coordinates: [ring] },
		};
		const { coverage: b } = await acceptedFeatures([e1, box('e2', 11, 47, 12, 48)]);
		const { beside } = await found(a, b, 5);
		const lines = beside.filter(({ metres }) => metres > 0);
		expect(lines.map((pair) => `${a.keys[pair.a]}-${b.keys[pair.b]}`).sort()).toEqual([
			...['w1-e1', 'w2-e1', 'w2-e2'],
		]);
		expect(lines.every(({ metres }) => metres > 50_000)).toBe(true);
	});

	it('find nobody where the sheets lie apart, and take a copy for the same', async () => {
		const { coverage: a } = await west();
		const { coverage: far } = await acceptedFeatures([box('w1', 20, 45, 21, 46)]);
		expect(await found(a, far)).toMatchObject({ same: [], beside: [] });
		const copy = await found(a, a);
		expect(copy.same).toEqual([
			[0, 0],
			[1, 1],
		]);
		expect(copy.beside).toEqual([]);
	});
});
