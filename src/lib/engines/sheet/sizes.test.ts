import { describe, expect, it } from 'vitest';
import { layout, sheetOf, statesCoverage } from '../../../../tests/support/sheets.ts';
import { drawSheet, paperSize, regionSizesMm, sheetTable } from './index.ts';
import { ringPoints } from './fills.ts';

describe('sizes on the sheet', () => {
	const coverage = statesCoverage();

	it('are those of the drawing without its legend, to a tenth', () => {
		const drawing = drawSheet(sheetOf(coverage));
		const sizes = regionSizesMm(coverage, layout);
		const colorado = coverage.names.indexOf('Colorado');
		const points = ringPoints(drawing, drawing.fills[colorado].rings[0]);
		const ys = points.filter((_, i) => i % 2 === 1);
		const height = (Math.max(...ys) - Math.min(...ys)) / 100;
		expect(Math.abs(sizes[colorado] / height - 1)).toBeLessThan(0.1);
		expect(sizes[coverage.names.indexOf('Rhode Island')]).toBeLessThan(5);
	});

	it.each(['foot', 'left', 'right', 'corner'] as const)(
		'are those of the drawing with twelve inks in a legend at the %s, to a fiftieth',
		(legendAt) => {
			const twelve = Array.from({ length: 12 }, (_, i) => ({
				...{ name: `An ink with a longer name, number ${i + 1}`, hex: '#88aabb' },
			}));
			const set = { ...layout, collar: { ...layout.collar, legendAt } };
			const drawing = drawSheet(sheetOf(coverage, { layout: set, inks: twelve }));
			const sizes = regionSizesMm(coverage, set, twelve);
			const colorado = coverage.names.indexOf('Colorado');
			const ys = ringPoints(drawing, drawing.fills[colorado].rings[0]).filter((_, i) => i % 2);
			const height = (Math.max(...ys) - Math.min(...ys)) / 100;
			expect(Math.abs(sizes[colorado] / height - 1)).toBeLessThan(0.02);
		},
	);

	it('grow with the paper as its side does', () => {
		const a4 = regionSizesMm(coverage, layout);
		const a2 = regionSizesMm(coverage, { ...layout, paper: 'A2' });
		expect(a2[0] / a4[0]).toBeGreaterThan(1.9);
		expect(a2[0] / a4[0]).toBeLessThan(2.3);
	});
});

describe('paper', () => {
	it('has the sizes of ISO 216', () => {
		expect(paperSize({ ...layout, paper: 'A0', orientation: 'portrait' })).toEqual({
			widthMm: 841,
			heightMm: 1189,
		});
		expect(paperSize(layout)).toEqual({ widthMm: 297, heightMm: 210 });
		for (const widthMm of [0, NaN, -5, 1e6]) {
			expect(() => paperSize({ ...layout, paper: { widthMm, heightMm: 100 } })).toThrow(RangeError);
		}
	});
});

describe('the table', () => {
	it('has a row a region with the ink itself, whoever reads', () => {
		const coverage = statesCoverage();
		const sheet = sheetOf(coverage, { reader: 'grey' });
		const drawing = drawSheet(sheet);
		const rows = sheetTable(drawing, coverage, sheet.groups);
		expect(rows.map(({ key }) => key)).toEqual(coverage.keys);
		expect(rows.every(({ hex, inkNumber }) => hex === sheet.inks[inkNumber! - 1].hex)).toBe(true);
		expect(rows.filter(({ labelled }) => !labelled).length).toBe(drawing.unplaced.length);
		const bare = drawSheet({ ...sheet, colouring: null });
		expect(sheetTable(bare, coverage, sheet.groups)[0]).toMatchObject({
			inkNumber: null,
			hex: null,
		});
	});
});
