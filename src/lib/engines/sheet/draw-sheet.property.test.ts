import fc from 'fast-check';
import Flatbush from 'flatbush';
import { describe, expect, it } from 'vitest';
import { inks, layout, sheetOf, statesCoverage } from '../../../../tests/support/sheets.ts';
import type { DrawnText, Drawing } from './drawing.ts';
import { caution, drawSheet, recolour } from './index.ts';
import { ringPoints } from './fills.ts';

const coverage = statesCoverage();

/** Box of a text by the cap height and descender of the shipped faces. */
function boxOf({ x, y, width, size }: DrawnText): [number, number, number, number] {
	return [x, y - 0.7 * size, x + width, y + 0.2 * size];
}

/** Pairs of texts whose boxes overlap, found with a spatial index. */
function overlaps(texts: DrawnText[]): [string, string][] {
	if (texts.length === 0) return [];
	const index = new Flatbush(texts.length);
	for (const text of texts) index.add(...boxOf(text));
	index.finish();
	return texts.flatMap((text, i) =>
		index
			.search(...boxOf(text))
			.filter((j) => j > i)
			.map((j): [string, string] => [text.text, texts[j].text]),
	);
}

function isInside(drawing: Drawing, region: number, x: number, y: number): boolean {
	let inside = false;
	for (const ring of drawing.fills[region].rings) {
		const p = ringPoints(drawing, ring);
		for (let i = 0, j = p.length - 2; i < p.length; j = i, i += 2) {
			const over = p[i + 1] > y !== p[j + 1] > y;
			if (over && x < ((p[j] - p[i]) * (y - p[i + 1])) / (p[j + 1] - p[i + 1]) + p[i]) {
				inside = !inside;
			}
		}
	}
	return inside;
}

/** Share of 45 places in a text's box that lie in one of some regions. */
function shareIn(drawing: Drawing, text: DrawnText, regions: number[]): number {
	const [left, top, right, bottom] = boxOf(text);
	const steps = [0.1, 0.3, 0.5, 0.7, 0.9];
	const places = steps.flatMap((down) =>
		[...steps, 0.2, 0.4, 0.6, 0.8].map((across): [number, number] => [
			left + (right - left) * across,
			top + (bottom - top) * down,
		]),
	);
	const within = ([x, y]: [number, number]) =>
		regions.some((region) => isInside(drawing, region, x, y));
	return places.filter(within).length / places.length;
}

/** Places along every leader, an eighth of it apart. */
function leaderPlaces({ lines, arcPoints, arcStarts }: Drawing): [number, number][] {
	const arcs = lines.find(({ rank }) => rank === 'leader')?.arcs ?? new Uint32Array();
	return [...arcs].flatMap((arc) => {
		const [x0, y0, x1, y1] = arcPoints.subarray(2 * arcStarts[arc], 2 * arcStarts[arc + 1]);
		return [0, 1, 2, 3, 4, 5, 6, 7, 8].map((i): [number, number] => [
			x0 + ((x1 - x0) * i) / 8,
			y0 + ((y1 - y0) * i) / 8,
		]);
	});
}

function strays({ texts, widthMm, heightMm }: Drawing): DrawnText[] {
	return texts.filter((text) => {
		const [left, top, right, bottom] = boxOf(text);
		return left < 0 || top < 0 || right > 100 * widthMm || bottom > 100 * heightMm;
	});
}

const word = fc.string({ unit: fc.constantFrom(...'aMiłßΩЖ W-漢'), minLength: 1, maxLength: 24 });
const anyText = fc.string({ unit: 'binary', maxLength: 200 });
const longWord = fc.integer({ min: 1, max: 200 }).map((length) => 'M'.repeat(length));

/** A first line much shorter than the second, in a region that slants: the second alone lay on it once. */
const slanting = Array.from({ length: 49 }, (_, region) => {
	if (region === 0) return 'aaaaaaaaWM';
	return region === 8 ? 'W-ßWaWa' : 'a';
});

describe('labels', () => {
	it('never overlap, and stand inside their own region or on empty paper', () => {
		const names = fc.array(word, { minLength: 49, maxLength: 49 });
		const paper = fc.constantFrom('A5', 'A4', 'A3') as fc.Arbitrary<'A5' | 'A4' | 'A3'>;
		fc.assert(
			fc.property(names, paper, (list, size) => {
				const drawing = drawSheet(
					sheetOf({ ...coverage, names: list }, { layout: { ...layout, paper: size } }),
				);
				const labels = drawing.texts.filter((text) => text.layer === 'label');
				expect(overlaps(labels)).toEqual([]);
				expect(strays(drawing)).toEqual([]);
				for (const label of labels.filter(({ halo }) => halo)) {
					expect(shareIn(drawing, label, [label.region!])).toBeGreaterThan(0.55);
					const all = drawing.fills.map(({ region }) => region);
					expect(shareIn(drawing, label, all)).toBe(1);
				}
				for (const label of labels.filter(({ halo }) => !halo)) {
					const [left, top, right, bottom] = boxOf(label);
					for (const x of [left, (left + right) / 2, right]) {
						for (const y of [top, bottom]) {
							drawing.fills.forEach(({ region }) => {
								const own = label.onFill === true && region === label.region;
								expect(isInside(drawing, region, x, y)).toBe(own);
							});
						}
					}
				}
				for (const place of leaderPlaces(drawing)) {
					const over = drawing.fills.filter(({ region }) => isInside(drawing, region, ...place));
					expect(over.length).toBeLessThan(2);
				}
				const placed = new Set(labels.map(({ region }) => region));
				expect(placed.size + drawing.unplaced.length).toBe(49);
				for (const region of drawing.unplaced) expect(placed.has(region)).toBe(false);
			}),
			{ numRuns: 6, examples: [[slanting, 'A3']] },
		);
	});
});

describe('the collar', () => {
	it('stays on the paper with the whole caution, whatever is written', () => {
		const side = fc.integer({ min: 50, max: 900 });
		const text = fc.oneof(anyText, longWord);
		fc.assert(
			fc.property(
				side,
				side,
				fc.double({ min: 0, max: 40, noNaN: true }),
				text,
				text,
				text,
				(widthMm, heightMm, marginMm, title, subtitle, credits) => {
					const drawing = drawSheet(
						sheetOf(coverage, {
							layout: {
								...layout,
								...{
									title,
									subtitle,
									credits,
									marginMm,
									paper: { widthMm, heightMm },
									labels: false,
								},
							},
							inks: inks.map((ink) => ({ ...ink, name: title })),
							issue: subtitle,
							weak: [{ border: 0, reader: 'deutan', found: 3, asked: 10, severity: 'error' }],
						}),
					);
					expect(strays(drawing)).toEqual([]);
					const collar = drawing.texts.filter(({ layer }) => layer === 'collar');
					const said = collar.map((one) => one.text).join(' ');
					expect(said.replaceAll(' ', '')).toContain(caution.replaceAll(' ', ''));
					expect(overlaps(drawing.texts.filter(({ layer }) => layer !== 'label'))).toEqual([]);
				},
			),
			{ numRuns: 25 },
		);
	});
});

describe('recolouring', () => {
	it('gives what drawing anew gives', () => {
		const sheet = sheetOf(coverage);
		const drawing = drawSheet(sheet);
		const other = sheet.colouring!.map((ink) => (ink + 3) % 7);
		for (const reader of ['typical', 'deutan', 'grey'] as const) {
			const anew = drawSheet({ ...sheet, colouring: other, reader });
			expect(recolour(drawing, other, inks, reader)).toEqual(anew);
		}
		expect(drawing).toEqual(drawSheet(sheet));
		expect(() => recolour(drawing, other, inks.slice(1), 'typical')).toThrow(RangeError);
	});
});
