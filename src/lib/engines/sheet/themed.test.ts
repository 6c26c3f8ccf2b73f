import { describe, expect, it } from 'vitest';
import { sheetOf, statesCoverage } from '../../../../tests/support/sheets.ts';
import { limitsOf, themeClasses, type Theme } from '../measures/index.ts';
import { drawSheet } from './draw-sheet.ts';
import { recolour } from './recolour.ts';
import { sheetTheme } from './sheet-theme.ts';
import { sheetTable } from './table.ts';

const coverage = statesCoverage();
const ground = {
	values: coverage.keys.map((_, i) => (i === 4 ? null : i === 7 ? 2 : 10 + ((i * 37) % 300))),
	areasKm2: coverage.areasKm2,
	denominators: null,
};
const asked: Theme = {
	...{ measure: 'visits', per: { kind: 'none' }, isRate: true, method: 'equal-steps' },
	...{ classes: 6, breaks: [], rounded: true, ramp: 'viridis', reversed: false, middle: null },
	...{ suppressBelow: 5, title: 'Visits in a year' },
};
const theme = { ...asked, breaks: limitsOf(asked, ground) };
const classes = themeClasses(theme, ground);
const shown = sheetTheme(theme, classes, { table: 'visits', date: '1 December 2026', holds: true });

describe('a themed sheet', () => {
	const drawing = drawSheet(sheetOf(coverage, { theme: shown }));
	const words = drawing.texts.map(({ text }) => text).join('\n');

	it('fills every region by its class and lists every class under the title', () => {
		drawing.fills.forEach(({ ink, hex }, region) => {
			expect(ink).toBe(classes.classes[region]);
			expect(hex).toBe(shown.inks[ink].hex);
		});
		for (const range of classes.ranges) expect(words).toContain(range);
		expect(words).toContain('Visits in a year');
		expect(words).toContain('Figures: visits, 1 December 2026.');
	});

	it('hatches what is not told, each in its own way', () => {
		const hatched = drawing.shapes.filter(({ layer }) => layer === 'hatch').map(({ ink }) => ink);
		expect(new Set(hatched)).toEqual(new Set([6, 7]));
		expect(words).toContain('no data');
		expect(words).toContain('suppressed');
	});

	it('still draws the border between regions of one class', () => {
		const plain = drawSheet(sheetOf(coverage));
		const arcs = ({ lines }: typeof plain) =>
			lines
				.filter(({ rank }) => rank === 'region')
				.reduce((sum, line) => sum + line.arcs.length, 0);
		expect(arcs(plain)).toBeGreaterThan(100);
		// a taller legend leaves the map a little less room, and the shortest arcs shrink to nothing
		expect(Math.abs(arcs(drawing) - arcs(plain))).toBeLessThan(4);
	});

	it('is seen through other eyes as if it were drawn for them', () => {
		const again = recolour(drawing, shown.classes, shown.inks, 'deutan');
		const fresh = drawSheet(sheetOf(coverage, { theme: shown, reader: 'deutan' }));
		expect(again.fills.map(({ hex }) => hex)).toEqual(fresh.fills.map(({ hex }) => hex));
		expect(again.description).toBe(fresh.description);
	});

	it('says of small counts below which figure they are suppressed, fractions too', () => {
		const noteFor = (suppressBelow: number) =>
			sheetTheme(
				{ ...theme, suppressBelow },
				{ ...classes, suppressed: [7] },
				{ table: null, date: null, holds: true },
			).note;
		expect(noteFor(1500)).toContain('below 1,500 are suppressed');
		expect(noteFor(0.0004)).toContain('below 0.0004 are suppressed');
	});

	it('tells class and range in its table, and no figure', () => {
		const rows = sheetTable(
			drawing,
			coverage,
			coverage.keys.map(() => null),
		);
		expect(rows[4].theme).toEqual({ class: null, range: 'no data' });
		expect(rows[7].theme).toEqual({ class: null, range: 'suppressed' });
		expect(rows[0].theme).toEqual({ class: 1, range: classes.ranges[0] });
	});
});
