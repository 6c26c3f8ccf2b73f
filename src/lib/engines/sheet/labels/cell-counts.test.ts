import fc from 'fast-check';
import { expect, it } from 'vitest';
import type { Box } from '../plane/fit.ts';
import { countCells } from './cell-counts.ts';
import { cellsOf, edge, outline, paper, type RegionRaster } from './region-raster.ts';
import { ownShare } from './ground.ts';

const cell = 20;
const grounds = fc
	.record({ columns: fc.integer({ min: 1, max: 12 }), rows: fc.integer({ min: 1, max: 12 }) })
	.chain(({ columns, rows }) => {
		const size = { minLength: columns * rows, maxLength: columns * rows };
		const owners = fc.oneof(
			{ weight: 20, arbitrary: fc.constant(0) },
			{ weight: 6, arbitrary: fc.constantFrom<number>(outline, 1) },
			{ weight: 1, arbitrary: fc.constantFrom<number>(edge, paper, 2) },
		);
		return fc.record({
			owner: fc.array(owners, size),
			busy: fc.array(
				fc.oneof(
					{ weight: 40, arbitrary: fc.constant(0) },
					{ weight: 1, arbitrary: fc.constant(1) },
				),
				size,
			),
			columns: fc.constant(columns),
			rows: fc.constant(rows),
		});
	});
const boxes = fc.record<Box>({
	x: fc.integer({ min: -30, max: 200 }),
	y: fc.integer({ min: -30, max: 200 }),
	width: fc.integer({ min: 1, max: 120 }),
	height: fc.integer({ min: 1, max: 120 }),
});

/** The share as it is said, by going through every cell of the box. */
function byEveryCell(raster: RegionRaster, busy: number[], box: Box, region: number): number {
	const [left, right, top, bottom] = cellsOf(raster, box);
	if (left < 0 || top < 0 || right >= raster.columns || bottom >= raster.rows) return 0;
	const inside: number[] = [];
	for (let row = top; row <= bottom; row++)
		for (let column = left; column <= right; column++) inside.push(row * raster.columns + column);
	if (inside.some((i) => busy[i] || raster.owner[i] === edge)) return 0;
	const counted = inside.filter((i) => raster.owner[i] !== outline);
	const own = counted.filter((i) => raster.owner[i] === region).length;
	return own ? own / counted.length : 0;
}

it('says the share of a box that going through its cells says, wherever it is enough', () => {
	let enough = 0;
	fc.assert(
		fc.property(
			grounds,
			boxes,
			fc.constantFrom(0, 0, 0, 1, 2),
			({ owner, busy, ...grid }, box, region) => {
				const raster: RegionRaster = {
					...{ ...grid, cell, x: 0, y: 0, owner: Int32Array.from(owner) },
					spans: new Int32Array(12),
				};
				const ground = {
					...{ raster, counts: countCells(raster), busy: Uint8Array.from(busy) },
					room: new Uint16Array(owner.length),
				};
				const told = byEveryCell(raster, busy, box, region);
				const said = ownShare(ground, box, region, 0.6);
				if (told >= 0.6) expect(said).toBe(told);
				else expect(said).toBeLessThan(0.6);
				if (told >= 0.6) enough++;
			},
		),
		{ numRuns: 2_000, seed: 4 },
	);
	expect(enough).toBeGreaterThan(50);
});
