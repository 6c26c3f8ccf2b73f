import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	layout,
	sheetOf,
	statesCoverage,
	worldCoverage,
} from '../../../../../tests/support/sheets.ts';
import type { Coverage } from '../../boundaries/coverage.ts';
import { drawSheet, isSetIn } from '../index.ts';
import type { SheetLayout } from '../layout.ts';
import { placeOnPaper } from '../place-on-paper.ts';
import { lonStep } from '../plane/extent.ts';
import { insideOf, outsideOf, type Line } from './clip-lines.ts';
import { overlaps } from './figures.ts';
import { graticuleLines } from './lines.ts';
import { groundAt } from './seen-degrees.ts';
import { figureOf, graticuleSteps } from './step.ts';

const box = { x: 1000, y: 2000, width: 24_000, height: 14_000 };
const withGraticule = (more: Partial<SheetLayout> = {}): SheetLayout => ({
	...layout,
	labels: false,
	...more,
	frame: { ...layout.frame, graticule: { step: 'auto', figures: true }, ...more.frame },
});

const placed = (coverage: Coverage, projection: SheetLayout['projection'] = 'auto') =>
	placeOnPaper(coverage, withGraticule({ projection }), () => ({ map: box, scale: 1 }));

const maps: [string, () => Coverage, SheetLayout['projection']][] = [
	['the states, conic', statesCoverage, 'auto'],
	['the states, transverse', statesCoverage, 'transverse-equal-area'],
	['Chile, transverse', () => worldCoverage(['Chile']), 'auto'],
	['Antarctica, polar', () => worldCoverage(['Antarctica']), 'auto'],
	['Russia, across 180°', () => worldCoverage(['Russia']), 'auto'],
	['the world, Equal Earth', () => worldCoverage(), 'auto'],
	['the world, cylindrical', () => worldCoverage(), 'cylindrical-equal-area'],
];

describe('the graticule', () => {
	it.each(maps)('of %s runs where its figures say, within its box', (_, coverage, projection) => {
		const map = placed(coverage(), projection);
		const { lines } = graticuleLines(map, graticuleSteps('auto', map.extent));
		expect(lines.length).toBeGreaterThan(3);
		for (const { kind, value, pieces } of lines) {
			for (const piece of pieces) {
				for (const [x, y] of piece) {
					expect(x).toBeGreaterThan(map.box.x - 1);
					expect(x).toBeLessThan(map.box.x + map.box.width + 1);
					expect(y).toBeGreaterThan(map.box.y - 1);
					expect(y).toBeLessThan(map.box.y + map.box.height + 1);
				}
				// the ends of a piece may be cut between two places, its inner places are on the line
				for (const [x, y] of piece.slice(1, -1)) {
					const place = groundAt(map.chosen.projection, map.fit, x, y);
					if (!place || Math.abs(place[1]) > 89.9) continue;
					const off = kind === 'meridian' ? lonStep(value, place[0]) : place[1] - value;
					expect(Math.abs(off)).toBeLessThan(1e-4);
				}
			}
		}
	});

	it('lies under borders and carries figures that overlap nothing', () => {
		for (const coverage of [statesCoverage(), worldCoverage(['Antarctica']), worldCoverage()]) {
			const drawing = drawSheet(sheetOf(coverage, { layout: withGraticule({ labels: true }) }));
			expect(drawing.shapes.some(({ layer }) => layer === 'graticule')).toBe(true);
			const figures = drawing.texts.filter(({ layer }) => layer === 'graticule');
			expect(figures.length).toBeGreaterThan(5);
			const names = drawing.texts.filter(({ layer }) => layer === 'label');
			figures.forEach((one, i) => {
				for (const other of [...figures.slice(i + 1), ...names])
					expect(overlaps(one, other)).toBe(false);
			});
		}
	});

	it('takes a step of the user’s own, and says where it gives no line', () => {
		const step = (degrees: number) =>
			drawSheet(
				sheetOf(statesCoverage(), {
					layout: withGraticule({
						frame: { ...layout.frame, graticule: { step: degrees, figures: true } },
					}),
				}),
			);
		expect(step(20).texts.map(({ text }) => text)).toContain('100° W');
		expect(step(20).texts.map(({ text }) => text)).not.toContain('110° W');
		expect(step(0.01).frame.told.join()).toMatch(/No graticule is drawn/);
	});
});

describe('figures', () => {
	it.each([
		[-96, '96° W'],
		[0, '0°'],
		[180, '180°'],
		[4.5, "4° 30' E"],
		[10 / 60, "0° 10' E"],
		[0.125, '0.125° E'],
	])('%d is %s', (value, words) => {
		expect(figureOf(value, 'E', 'W')).toBe(words);
		expect(isSetIn('sans', words)).toBe(true);
	});
});

describe('cutting lines at boxes', () => {
	const place = fc.tuple(fc.integer({ min: -50, max: 150 }), fc.integer({ min: -50, max: 150 }));
	const line = fc.array(place, { minLength: 2, maxLength: 8 }) as fc.Arbitrary<Line>;
	const square = { x: 0, y: 0, width: 100, height: 100 };
	const length = (lines: Line[]) =>
		lines.reduce(
			(sum, one) =>
				sum +
				one.slice(1).reduce((own, [x, y], i) => own + Math.hypot(x - one[i][0], y - one[i][1]), 0),
			0,
		);

	it('parts a line into what is inside and what is outside, and loses nothing', () => {
		fc.assert(
			fc.property(line, (one) => {
				const [within, without] = [insideOf(one, square), outsideOf(one, square)];
				expect(length(within) + length(without)).toBeCloseTo(length([one]), 6);
				for (const [x, y] of within.flat()) {
					expect(Math.min(x, y)).toBeGreaterThan(-1e-9);
					expect(Math.max(x, y)).toBeLessThan(100 + 1e-9);
				}
				for (const piece of without) {
					piece.slice(1).forEach(([x, y], i) => {
						const [mx, my] = [(x + piece[i][0]) / 2, (y + piece[i][1]) / 2];
						const deep = mx > 1e-6 && mx < 100 - 1e-6 && my > 1e-6 && my < 100 - 1e-6;
						expect(deep).toBe(false);
					});
				}
			}),
		);
	});
});
