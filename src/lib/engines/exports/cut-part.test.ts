import { booleanValid, multiPolygon } from '@turf/turf';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { LonLat } from '../sheet/index.ts';
import { cutPart, type Rings } from './cut-part.ts';

const closed = (ring: LonLat[]): LonLat[] => [...ring, ring[0]];
const box = (west: number, south: number, east: number, north: number): LonLat[] =>
	closed([
		[west, south],
		[east, south],
		[east, north],
		[west, north],
	]);
const hole = (...sides: [number, number, number, number]) => box(...sides).toReversed();

/** Square degrees by the sum over triangles. */
const area = (rings: Rings): number =>
	rings.reduce(
		(all, ring) =>
			ring.slice(1).reduce((sum, [x, y], i) => sum + (ring[i][0] * y - x * ring[i][1]) / 2, all),
		0,
	);
const total = (polygons: Rings[]) => polygons.reduce((sum, one) => sum + area(one), 0);
const boxes = (polygons: Rings[]) =>
	polygons
		.map(([outer]) => [...Array(2).keys()].flatMap((axis) => ends(outer.map((at) => at[axis]))))
		.map(([west, east, south, north]) => [west, south, east, north].join(' '));
const ends = (values: number[]) => [Math.min(...values), Math.max(...values)];
/** By the rules of Simple Features, as turf 7 checks them. */
const valid = (polygons: Rings[]) => booleanValid(multiPolygon(polygons));

/** Land to the west with prongs across 180 degrees at the latitudes given. */
function comb(prongs: [number, number][], tip = 185): LonLat[] {
	const top = prongs[prongs.length - 1][1] + 5;
	const edge = prongs.flatMap(([south, north]): LonLat[] => [
		[178, south],
		[tip, south],
		[tip, north],
		[178, north],
	]);
	return closed([[170, -5], [178, -5], ...edge, [178, top], [170, top]]);
}

describe('a polygon across 180 degrees', () => {
	it('that crosses it three times is one piece to the west and three to the east', () => {
		const part = [comb([[0, 2], [4, 6], [8, 10]])]; // prettier-ignore
		const cut = cutPart(part);
		expect(boxes(cut)).toEqual([
			'170 -5 180 15',
			...['-180 0 -175 2', '-180 4 -175 6', '-180 8 -175 10'],
		]);
		expect(total(cut)).toBeCloseTo(area(part), 9);
		expect(valid(cut)).toBe(true);
	});

	it('keeps a hole beside the meridian as one, and takes one across it into the edge', () => {
		const part = [
			box(170, 0, 190, 20),
			...[hole(172, 2, 174, 4), hole(178, 8, 183, 12), hole(186, 15, 188, 16)],
		];
		const cut = cutPart(part);
		expect(cut.map((rings) => rings.length)).toEqual([2, 2]);
		expect(total(cut)).toBeCloseTo(area(part), 9);
		expect(valid(cut)).toBe(true);
	});

	it('is cut right where a hole is written a turn away, or touches the meridian', () => {
		const outer = box(170, 0, 190, 20);
		const away = cutPart([outer, hole(-178, 8, -176, 12)]);
		expect(away.map((rings) => rings.length)).toEqual([1, 2]);
		for (const touching of [hole(176, 8, 180, 12), hole(180, 8, 184, 12)]) {
			const cut = cutPart([outer, touching]);
			expect(cut.flat().every((ring) => ring.every(([lon]) => Math.abs(lon) <= 180))).toBe(true);
			expect(total(cut)).toBeCloseTo(area([outer, touching]), 9);
			expect(cut.length).toBe(2);
		}
	});

	it('that only reaches it is left as it is', () => {
		for (const part of [[box(170, 0, 180, 10)], [box(-180, 0, -170, 10)]])
			expect(cutPart(part)).toEqual([part]);
		expect(cutPart([box(180, 0, 190, 10)])).toEqual([[box(-180, 0, -170, 10)]]);
	});

	it('keeps its area and gives valid polygons, whatever its prongs and tips', () => {
		const steps = fc.array(fc.integer({ min: 1, max: 4 }), { minLength: 2, maxLength: 12 });
		fc.assert(
			fc.property(steps, fc.constantFrom(179, 180, 180.5, 200), (gaps, tip) => {
				const lats = gaps.map((_, i) => gaps.slice(0, i + 1).reduce((a, b) => a + b, 0));
				const prongs = lats.flatMap((lat, i): [number, number][] =>
					i % 2 ? [[lats[i - 1], lat]] : [],
				);
				const part = [comb(prongs, tip)];
				const cut = cutPart(part);
				expect(cut.length).toBe(tip > 180 ? prongs.length + 1 : 1);
				expect(total(cut)).toBeCloseTo(area(part), 6);
				expect(valid(cut)).toBe(true);
			}),
			{ numRuns: 60 },
		);
	});
});
