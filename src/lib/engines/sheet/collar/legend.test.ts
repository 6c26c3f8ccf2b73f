import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { topologyOf } from '../../../../../tests/support/atlas.ts';
import { coverageFrom } from '../../../../../tests/support/coverage.ts';
import { inks, layout, sheetOf, statesCoverage } from '../../../../../tests/support/sheets.ts';
import { drawSheet } from '../draw-sheet.ts';
import type { Drawing } from '../drawing.ts';
import { caution, papers, type SheetLayout } from '../layout.ts';
import { plainCollar, type CollarLook } from '../layout/collar.ts';
import type { Box } from '../plane/fit.ts';
import { recolour } from '../recolour.ts';
import { textWidth } from '../type/text-width.ts';
import { textBlocks } from './text-blocks.ts';

const coverage = statesCoverage();
const twelve = [
	...inks,
	{ name: 'Fern and river meadow, with the islands of the north', hex: '#b6d7a8' },
	...['#a64d2b', '#a4c8e0', '#22304a'].map((hex, i) => ({ name: `Ink ${i}`, hex })),
];
const all = Int32Array.from(coverage.keys, (_, region) => region % 12);
const sheet = (change: Partial<SheetLayout>, collar: Partial<CollarLook> = {}) =>
	sheetOf(coverage, {
		inks: twelve,
		colouring: all,
		layout: { ...layout, ...change, collar: { ...plainCollar, ...collar } },
	});

const boxesOf = ({ rects, texts }: Drawing): Box[] => [
	...rects.filter(({ layer }) => layer === 'legend'),
	...texts
		.filter(({ layer }) => layer === 'legend')
		.map(({ x, y, size, width }) => ({ x, y: y - 0.7 * size, width, height: 0.9 * size })),
];
const overlap = (a: Box, b: Box) =>
	a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
const words = ({ texts }: Drawing, layer: string) =>
	texts.filter((text) => text.layer === layer).map(({ text }) => text);

const anyCollar = fc.record({
	legendAt: fc.constantFrom('foot' as const, 'left' as const, 'right' as const, 'corner' as const),
	legendTitle: fc.constantFrom('', 'Sales districts of the eastern half'),
	legendCounts: fc.boolean(),
	legendLines: fc.boolean(),
	legendColumns: fc.constantFrom(null, 1, 2, 4),
});
const anyPaper = fc.record({
	paper: fc.constantFrom(...papers),
	orientation: fc.constantFrom('landscape' as const, 'portrait' as const),
});

describe('a legend of twelve inks', () => {
	it('fits from A5 to A0 at every place: on the paper, over no fill name, its own place and no more', () => {
		fc.assert(
			fc.property(anyPaper, anyCollar, (paper, collar) => {
				const drawing = drawSheet(sheet(paper, collar));
				const boxes = boxesOf(drawing);
				const { legend, widthMm, heightMm } = drawing;
				if (!legend) throw new Error('no legend');
				for (const { x, y, width, height } of boxes) {
					expect(x).toBeGreaterThanOrEqual(legend.x - 1);
					expect(y).toBeGreaterThanOrEqual(legend.y - 1);
					expect(x + width).toBeLessThanOrEqual(legend.x + Math.max(legend.width, 1) + legend.size);
					expect(y + height).toBeLessThanOrEqual(legend.y + legend.height + 1);
					expect(x + width).toBeLessThanOrEqual(widthMm * 100);
					expect(y + height).toBeLessThanOrEqual(heightMm * 100);
				}
				const others = drawing.texts.filter(({ layer }) => layer !== 'legend');
				for (const { x, y, size, width } of others) {
					const box = { x, y: y - 0.6 * size, width, height: 0.6 * size };
					expect(boxes.filter((one) => overlap(one, box))).toEqual([]);
				}
				expect(drawing.rects.filter(({ layer }) => layer === 'legend')).toHaveLength(12);
				expect(words(drawing, 'collar').join(' ')).toContain(caution);
			}),
			{ numRuns: 8 },
		);
	});

	it('wraps a long name whole, and keeps its place when inks fall out of use', () => {
		const drawing = drawSheet(sheet({ paper: 'A5', orientation: 'portrait' }));
		expect(words(drawing, 'legend').join(' ')).toContain(twelve[8].name);
		const few = recolour(
			drawing,
			all.map((ink) => (ink < 8 ? 8 : ink)),
			twelve,
			'typical',
		);
		const { legend } = few;
		const lowest = Math.max(...boxesOf(few).map(({ y, height }) => y + height));
		expect(lowest).toBeLessThanOrEqual(legend!.y + legend!.height + 1);
		expect(few.rects.filter(({ layer }) => layer === 'legend')).toHaveLength(4);
	});

	it('tells how many regions each ink has, most first where asked', () => {
		const colouring = all.map((ink, region) => (region < 30 ? 5 : ink));
		const input = sheet({}, { legendCounts: true, legendOrder: 'regions', legendAt: 'left' });
		const told = words(drawSheet({ ...input, colouring }), 'legend').filter((one) =>
			/region/.test(one),
		);
		const counts = told.map((one) => Number(/(\d+) regions?$/.exec(one)?.[1]));
		const expected = twelve.map((_, ink) => colouring.filter((one) => one === ink).length);
		expect(counts.filter(Boolean)).toEqual(expected.filter(Boolean).sort((a, b) => b - a));
	});

	it('says every count whole, whichever digits it has', () => {
		// figures of the face differ in width: 30 and 39 are wider than 49, all regions there are
		const four = inks.slice(0, 4);
		for (let first = 1; first < 47; first++) {
			const colouring = all.map((_, region) => (region < first ? 2 : [0, 1, 3][region % 3]));
			const input = sheet({}, { legendCounts: true });
			const told = words(drawSheet({ ...input, inks: four, colouring }), 'legend');
			expect(told.filter((one) => one.includes('…'))).toEqual([]);
		}
	});

	it('says what the lines stand for only where they are drawn', () => {
		const lineNames = { outer: 'Coast and frontier', group: '', region: '' };
		const input = sheet({ groupColumn: 'province' }, { legendLines: true, lineNames });
		const found = drawSheet(input);
		expect(words(found, 'legend')).toContain('Coast and frontier');
		expect(words(found, 'legend').join(' ')).not.toContain('level above');
		const groups = coverage.keys.map((key) => (Number(key) < 30 ? 'East' : 'West'));
		expect(words(drawSheet({ ...input, groups }), 'legend').join(' ')).toContain(
			'Boundary of the level above',
		);
		expect(found.shapes.filter(({ layer }) => layer === 'legend')).toHaveLength(2);
	});

	it('goes to the foot and says so where no corner of the map is empty', () => {
		// Colorado is nearly a rectangle, so its corners are the map's
		const colorado = coverageFrom(topologyOf('us-atlas', 'states-10m.json'), 'states', {
			keep: (_, id) => id === '08',
		});
		expect(drawSheet(sheet({}, { legendAt: 'corner' })).notes.legend).toBe('');
		const tight = { paper: { widthMm: 200, heightMm: 190 } };
		const full = sheetOf(colorado, {
			colouring: Int32Array.of(0),
			layout: { ...layout, ...tight, collar: { ...plainCollar, legendAt: 'corner' } },
		});
		const drawing = drawSheet(full);
		expect(drawing.notes.legend).toMatch(/stands at the foot/);
		expect(drawing.legend!.y).toBeGreaterThan(10_000);
	});
});

const face = fc.constantFrom('sans' as const, 'serif' as const, 'serif-italic' as const);
const block = fc.record({
	text: fc.string({ maxLength: 80 }).map((text) => `${text}\nGulf of the north`),
	xMm: fc.double({ min: -50, max: 400, noNaN: true }),
	yMm: fc.double({ min: -50, max: 300, noNaN: true }),
	widthMm: fc.double({ min: 5, max: 300, noNaN: true }),
	sizePt: fc.integer({ min: 3, max: 40 }),
	face,
	ground: fc.boolean(),
});

describe('text blocks', () => {
	it('stand on the paper and never over the caution, no line wider than the block', () => {
		const paper = { x: 0, y: 0, width: 29_700, height: 21_000 };
		const small = { x: 1_200, y: 19_000, width: 27_300, height: 800 };
		fc.assert(
			fc.property(block, (one) => {
				for (const { box, texts } of textBlocks([one], paper, small)) {
					expect(overlap(box, small)).toBe(false);
					for (const { x, text, size, width } of texts) {
						expect(x).toBeGreaterThanOrEqual(box.x);
						expect(width).toBe(Math.ceil(textWidth(one.face, size, text)));
						if ([...text].length > 1) expect(width).toBeLessThanOrEqual(one.widthMm * 100 + 1);
					}
				}
			}),
		);
	});

	it('are avoided by the names of regions', () => {
		const boxed = { text: 'A note', xMm: 120, yMm: 80, widthMm: 60, sizePt: 24, ground: true };
		const blocks = [{ ...boxed, face: 'sans' as const }];
		const drawing = drawSheet(sheet({}, { blocks }));
		const ground = drawing.shapes.find(({ layer }) => layer === 'ground')!;
		const [x, y, right, , , bottom] = ground.points;
		const box = { x, y, width: right - x, height: bottom - y };
		const named = drawing.texts.filter(({ layer }) => layer === 'label');
		expect(named.length).toBeGreaterThan(20);
		for (const { x: left, y: base, width, size } of named)
			expect(overlap(box, { x: left, y: base - 0.7 * size, width, height: 0.7 * size })).toBe(
				false,
			);
		expect(words(drawing, 'block')).toEqual(['A note']);
	});
});
