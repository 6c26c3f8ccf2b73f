import { geoDistance } from 'd3-geo';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	layout,
	sheetOf,
	statesCoverage,
	worldCoverage,
} from '../../../../../tests/support/sheets.ts';
import { drawSheet } from '../index.ts';
import { placeOnPaper } from '../place-on-paper.ts';
import { lengthWords, roundLength, scaleBar } from './scale-bar.ts';

const even = { across: 10, down: 10 };

describe('scale bar', () => {
	it('is plain, marked or absent by how far the scale strays', () => {
		expect(scaleBar(even, [{ across: 10.1, down: 9.9 }], 3000)).toEqual({
			metres: 20_000,
			length: 2000,
			atCentre: false,
		});
		expect(scaleBar(even, [{ across: 10.5, down: 9.6 }], 3000)?.atCentre).toBe(true);
		expect(scaleBar(even, [{ across: 11.5, down: 9 }], 3000)).toBeNull();
	});

	it('shows the longest round length that fits', () => {
		fc.assert(
			fc.property(fc.double({ min: 1e-2, max: 1e9, noNaN: true }), (most) => {
				const length = roundLength(most);
				expect(length).toBeLessThanOrEqual(most * (1 + 1e-9));
				expect(length).toBeGreaterThan(most / 2.5001);
				expect(['1', '2', '5']).toContain(length.toExponential(6)[0]);
			}),
		);
		expect(lengthWords(25_000)).toEqual({ figure: '25', unit: 'km' });
		expect(lengthWords(500)).toEqual({ figure: '500', unit: 'm' });
	});

	it('is as long as the ground it stands for, measured by d3-geo on a sphere', () => {
		const drawing = drawSheet(sheetOf(statesCoverage()));
		const bar = drawing.rects.find(({ layer }) => layer === 'scale')!;
		const map = { x: 1200, y: 3000, width: 27_300, height: 13_000 };
		const { chosen } = placeOnPaper(statesCoverage(), layout, () => ({ map, scale: 1 }));
		// the same projection at another size: both bars stand for the same share of the map's width
		const across = drawing.arcPoints.filter((_, i) => i % 2 === 0);
		const width = across.reduce((a, b) => Math.max(a, b)) - across.reduce((a, b) => Math.min(a, b));
		const centre = chosen.projection([-96, 37.5])!;
		const step = 1e-3;
		const place = (dx: number) => chosen.projection.invert!([centre[0] + dx, centre[1]])!;
		const metres = (geoDistance(place(-step), place(step)) * 6_371_008.8) / (2 * step);
		const span = statesWidth(chosen.projection);
		const expected = (1_000_000 / metres / span) * width;
		// plain bars claim 2 % all over the sheet
		expect(Math.abs(bar.width / expected - 1)).toBeLessThan(0.02);
		const words = drawing.texts.map(({ text }) => text);
		expect(words).toContain('1,000 km');
	});

	it('is left off a map of the world, and the sheet says why', () => {
		const drawing = drawSheet(sheetOf(worldCoverage()));
		expect(drawing.rects.filter(({ layer }) => layer === 'scale')).toEqual([]);
		expect(drawing.notes.scale).toMatch(/no scale bar, because lengths differ by up to \d+ %/);
	});
});

function statesWidth(projection: (place: [number, number]) => [number, number] | null): number {
	const { arcPoints } = statesCoverage();
	let [least, most] = [Infinity, -Infinity];
	for (let i = 0; i < arcPoints.length; i += 2) {
		const [x] = projection([arcPoints[i], arcPoints[i + 1]])!;
		[least, most] = [Math.min(least, x), Math.max(most, x)];
	}
	return most - least;
}
