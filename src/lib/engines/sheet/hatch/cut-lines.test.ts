import { booleanPointInPolygon } from '@turf/turf';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { countiesCoverage, sheetOf, statesCoverage } from '../../../../../tests/support/sheets.ts';
import { asSeenBy } from '../../colour/index.ts';
import { drawSheet } from '../draw-sheet.ts';
import { ringPoints } from '../fills.ts';
import { recolour } from '../recolour.ts';
import { shapesIn } from '../shapes.ts';
import { inks } from '../../../../../tests/support/sheets.ts';
import { cutLines } from './cut-lines.ts';
import { hatchShapes } from './hatch-shapes.ts';

/** A star with a star-shaped hole: simple rings, whatever the radii. */
const star = (radii: number[], around: number, scale: number) =>
	radii.flatMap((radius, i) => {
		const angle = (2 * Math.PI * i) / radii.length;
		return [
			Math.round(around + scale * radius * Math.cos(angle)),
			Math.round(around + scale * radius * Math.sin(angle)),
		];
	});
const radii = fc.array(fc.integer({ min: 600, max: 1000 }), { minLength: 5, maxLength: 14 });
const area = fc
	.tuple(radii, radii)
	.map(([outer, inner]) => [star(outer, 3000, 2), star(inner, 3000, 0.4)]);
const family = fc.record({
	angle: fc.integer({ min: 0, max: 179 }),
	spacing: fc.integer({ min: 40, max: 400 }),
});

const polygon = (rings: number[][]) => ({
	type: 'Polygon' as const,
	coordinates: rings.map((ring) => {
		const points = Array.from({ length: ring.length / 2 }, (_, i) => ring.slice(2 * i, 2 * i + 2));
		return [...points, points[0]];
	}),
});
const fours = (list: ArrayLike<number>) =>
	Array.from({ length: list.length / 4 }, (_, i) => Array.from(list).slice(4 * i, 4 * i + 4));
const lengthOf = (segments: number[]) =>
	fours(segments).reduce((sum, [x1, y1, x2, y2]) => sum + Math.hypot(x2 - x1, y2 - y1), 0);

/** Length of all lines inside, by asking turf at every unit along each of them. */
function bruteForce(rings: number[][], angle: number, spacing: number, step: number): number {
	const [cos, sin] = [Math.cos((angle * Math.PI) / 180), Math.sin((angle * Math.PI) / 180)];
	const shape = polygon(rings);
	let inside = 0;
	for (let line = -Math.ceil(8000 / spacing); line <= 8000 / spacing; line++) {
		for (let along = -8000 + step / 2; along < 8000; along += step) {
			const x = along * cos + line * spacing * sin;
			const y = line * spacing * cos - along * sin;
			if (Math.hypot(x - 3000, y - 3000) > 2100) continue;
			if (booleanPointInPolygon([x, y], shape)) inside += step;
		}
	}
	return inside;
}

describe('hatch lines', () => {
	it('lie inside the area, on their family, by turf', () => {
		fc.assert(
			fc.property(area, family, (rings, { angle, spacing }) => {
				const [cos, sin] = [Math.cos((angle * Math.PI) / 180), Math.sin((angle * Math.PI) / 180)];
				for (const [x1, y1, x2, y2] of fours(cutLines(rings, { angle, spacing }))) {
					// ends are rounded, so slivers of a few hundredths are not asked about
					if (Math.hypot(x2 - x1, y2 - y1) > 20)
						expect(booleanPointInPolygon([(x1 + x2) / 2, (y1 + y2) / 2], polygon(rings))).toBe(
							true,
						);
					for (const [x, y] of [
						[x1, y1],
						[x2, y2],
					]) {
						const across = (x * sin + y * cos) / spacing;
						expect(Math.abs(across - Math.round(across)) * spacing).toBeLessThan(1);
					}
				}
			}),
			{ numRuns: 60 },
		);
	});

	it('are as long as those found point by point with turf', () => {
		fc.assert(
			fc.property(area, family, (rings, { angle, spacing }) => {
				const found = lengthOf(cutLines(rings, { angle, spacing: spacing + 200 }));
				const expected = bruteForce(rings, angle, spacing + 200, 20);
				// every end is off by half a step at most, and on average by none
				expect(Math.abs(found - expected)).toBeLessThan(0.01 * expected + 200);
			}),
			{ numRuns: 12 },
		);
	});

	it('run horizontally at 0 and rise to the right at 45 degrees, holes left out', () => {
		const square = [0, 0, 100, 0, 100, 100, 0, 100];
		const hole = [40, 20, 60, 20, 60, 80, 40, 80];
		expect(cutLines([square, hole], { angle: 0, spacing: 50, phase: 30 })).toEqual(
			[...[0, 30, 40, 30, 60, 30, 100, 30]].concat([0, 80, 100, 80]),
		);
		const rising = fours(cutLines([square], { angle: 45, spacing: 30 }));
		for (const [x1, y1, x2, y2] of rising) expect((y2 - y1) / (x2 - x1)).toBeCloseTo(-1, 1);
	});
});

const hatch = {
	kind: 'crossed',
	angle: 30,
	spacingMm: 1.2,
	widthMm: 0.15,
	hex: '#aa3300',
} as const;
const hatched = inks.map((ink, i) => (i === 0 || i === 2 ? { ...ink, hatch } : ink));

describe('hatches of a sheet', () => {
	const coverage = statesCoverage();
	const input = sheetOf(coverage, { inks: hatched });
	const drawing = drawSheet(input);

	it('cover the regions of their ink and no other, by turf', () => {
		const shapes = shapesIn(drawing, 'hatch');
		expect(shapes.map(({ ink }) => ink)).toEqual([0, 2]);
		for (const { ink, points } of shapes) {
			const own = drawing.fills.filter((fill) => fill.ink === ink);
			const rings = own.flatMap((fill) => fill.rings.map((ring) => ringPoints(drawing, ring)));
			const outlines = rings.map((ring) => polygon([ring]));
			const long = fours(points).filter(([x1, y1, x2, y2]) => Math.hypot(x2 - x1, y2 - y1) > 60);
			expect(long.length).toBeGreaterThan(100);
			for (const [x1, y1, x2, y2] of long.filter((_, i) => i % 7 === 0)) {
				const at = [(x1 + x2) / 2, (y1 + y2) / 2];
				expect(outlines.filter((one) => booleanPointInPolygon(at, one)).length % 2).toBe(1);
			}
		}
	});

	it('are seen as the reader sees them, and follow the inks when the sheet is coloured again', () => {
		const swapped = Int32Array.from(input.colouring!, (ink) =>
			ink === 0 ? 1 : ink === 1 ? 0 : ink,
		);
		const again = recolour(drawing, swapped, hatched, 'deutan');
		expect(again).toEqual(drawSheet({ ...input, colouring: swapped, reader: 'deutan' }));
		expect(shapesIn(again, 'hatch')[0].stroke).toBe(asSeenBy(hatch.hex, 'deutan'));
		expect(shapesIn(again, 'hatch')[0].stroke).not.toBe(hatch.hex);
	});

	it('are cut for 3,108 counties within a bounded number of segments', () => {
		const counties = drawSheet(sheetOf(countiesCoverage()));
		const all = { ...counties, inks: counties.inks.map((ink) => ({ ...ink, hatch })) };
		const count = hatchShapes(all, (hex) => hex).reduce(
			(sum, one) => sum + one.points.length / 4,
			0,
		);
		expect(count).toBeGreaterThan(10_000);
		expect(count).toBeLessThan(60_000);
	});
});
