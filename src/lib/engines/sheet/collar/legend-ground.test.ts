import { describe, expect, it } from 'vitest';
import { layout, sheetOf, worldCoverage } from '../../../../../tests/support/sheets.ts';
import { housePalettes } from '../../palettes/index.ts';
import { drawSheet } from '../draw-sheet.ts';
import type { Drawing } from '../drawing.ts';
import { plainCollar, type CollarLook } from '../layout/collar.ts';
import type { FrameLayout } from '../layout/frame.ts';
import { recolour } from '../recolour.ts';

const { inks } = housePalettes[5];
const islands = worldCoverage(['Fiji', 'Tonga', 'Samoa', 'Vanuatu', 'Solomon Is.']);

function sheet(colouring: number[], collar: Partial<CollarLook>, frame: Partial<FrameLayout>) {
	return sheetOf(islands, {
		...{ inks, colouring: Int32Array.from(islands.keys, (_, i) => colouring[i] ?? 0) },
		layout: {
			...layout,
			frame: { ...layout.frame, ...frame },
			collar: { ...plainCollar, legendAt: 'corner', ...collar },
		},
	});
}

/** Left, top, right, bottom. */
type Edges = [number, number, number, number];

function around(points: Int32Array): Edges {
	const [xs, ys] = [points.filter((_, i) => i % 2 === 0), points.filter((_, i) => i % 2 === 1)];
	return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)];
}

const groundsOf = ({ shapes }: Drawing) => shapes.filter(({ layer }) => layer === 'legend-ground');

/** What the legend says, from cap heights to descenders of the shipped faces. */
function said({ rects, texts }: Drawing): Edges {
	const boxes = [
		...rects
			.filter(({ layer }) => layer === 'legend')
			.map(({ x, y, width, height }) => [x, y, x + width, y + height]),
		...texts
			.filter(({ layer }) => layer === 'legend')
			.map(({ x, y, width, size }) => [x, y - 0.7 * size, x + width, y + 0.25 * size]),
	];
	const edge = (i: number) => boxes.map((box) => box[i]);
	return [Math.min(...edge(0)), Math.min(...edge(1)), Math.max(...edge(2)), Math.max(...edge(3))];
}

describe('the ground of a legend on the map', () => {
	it.each([[[0]], [[0, 1, 2]], [[0, 1, 2, 3, 4]]])(
		'is as large as what it says, in the corner of the map, with inks %j in use',
		(used) => {
			const drawing = drawSheet(sheet(used, { legendTitle: 'Offices' }, { neatLine: true }));
			const [ground, ...more] = groundsOf(drawing);
			expect(more).toEqual([]);
			const [box, words] = [around(ground.points), said(drawing)];
			const airs = [0, 1, 2, 3].map((i) => Math.abs(box[i] - words[i]));
			// air of the same width all round, to whole hundredths of a millimetre
			expect(Math.max(...airs) - Math.min(...airs)).toBeLessThanOrEqual(2);
			const line = around(drawing.shapes.find(({ layer }) => layer === 'neat-line')!.points);
			for (const [near, far] of [
				[0, 2],
				[1, 3],
			]) {
				const off = [near, far].map((i) => Math.abs(box[i] - line[i]));
				expect(Math.min(...off)).toBeLessThanOrEqual(2);
			}
			expect(ground.stroke).toBe('#000000');
		},
	);

	it('has no line round it where the map has no edge', () => {
		const [ground] = groundsOf(drawSheet(sheet([0, 1], {}, {})));
		expect(ground).toMatchObject({ stroke: null, strokeWidth: 0 });
	});

	it('grows and shrinks with the inks in use as if drawn anew', () => {
		const few = sheet([0, 1], {}, { sea: '#dfeaf2' });
		const many = sheet([0, 1, 2, 3, 4], {}, { sea: '#dfeaf2' });
		const [before, after] = [drawSheet(few), drawSheet(many)];
		expect(groundsOf(before)).not.toEqual(groundsOf(after));
		expect(recolour(before, many.colouring, inks, 'typical')).toEqual(after);
		expect(recolour(after, few.colouring, inks, 'typical')).toEqual(before);
	});

	it('is not there where the legend stands beside the map or there is none', () => {
		expect(groundsOf(drawSheet(sheet([0, 1], { legendAt: 'left' }, {})))).toEqual([]);
		const blank = { ...sheet([0, 1], {}, {}), colouring: null };
		expect(groundsOf(drawSheet(blank))).toEqual([]);
	});
});
