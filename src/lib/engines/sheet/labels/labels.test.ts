import { describe, expect, it } from 'vitest';
import {
	islandsSheet,
	namedSheet,
	statesSheet,
	tavaroeSheet,
} from '../../../../../tests/support/lettered-sheets.ts';
import type { Drawing, DrawnText } from '../drawing.ts';
import { drawSheet, isSetIn, type SheetInput } from '../index.ts';
import { plainLettering, type Lettering } from '../layout/lettering.ts';
import { proposeAbbreviations } from './abbreviate.ts';
import { isOnSheet } from './set-name.ts';

const lettered = (sheet: SheetInput, lettering: Partial<Lettering>): SheetInput => ({
	...sheet,
	layout: { ...sheet.layout, lettering: { ...plainLettering, ...lettering } },
});
const labelsOf = ({ texts }: Drawing, region: number) =>
	texts.filter((text) => text.layer === 'label' && text.region === region);
const boxOf = ({ x, y, width, size }: DrawnText) => [x, y - 0.7 * size, x + width, y + 0.2 * size];
const meet = (a: DrawnText, b: DrawnText) => {
	const [p, q] = [boxOf(a), boxOf(b)];
	return p[0] < q[2] && q[0] < p[2] && p[1] < q[3] && q[1] < p[3];
};
const overlapping = (texts: DrawnText[]) =>
	texts.flatMap((one, i) => texts.slice(i + 1).filter((other) => meet(one, other)));

/** Whether two leaders cross, by the signs of four triangles. */
function crossings({ lines, arcPoints, arcStarts }: Drawing): number {
	const arcs = [...(lines.find(({ rank }) => rank === 'leader')?.arcs ?? [])];
	const ends = arcs.map((arc) => [
		...arcPoints.subarray(2 * arcStarts[arc], 2 * arcStarts[arc] + 4),
	]);
	const side = (p: number[], x: number, y: number) =>
		Math.sign((p[2] - p[0]) * (y - p[1]) - (p[3] - p[1]) * (x - p[0]));
	const cross = (p: number[], q: number[]) =>
		side(p, q[0], q[1]) !== side(p, q[2], q[3]) && side(q, p[0], p[1]) !== side(q, p[2], p[3]);
	return ends.flatMap((p, i) => ends.slice(i + 1).filter((q) => cross(p, q))).length;
}

describe('names set by themselves', () => {
	it('say how every one is set, the same each time, on a crowded sheet with numbers and a list', async () => {
		const sheet = lettered(await tavaroeSheet(), { numbers: true });
		const drawing = drawSheet(sheet);
		const again = drawSheet(sheet);
		expect(again.lettering).toEqual(drawing.lettering);
		expect(again.texts).toEqual(drawing.texts);
		const { how, numbers } = drawing.lettering;
		const hows = how.map((one, region) => ({ one, drawn: labelsOf(drawing, region).length }));
		for (const { one, drawn } of hows) expect(drawn > 0, one).toBe(isOnSheet(one));
		// 65 of 180 names had no place before; now nine in ten are said on the sheet itself
		expect(how.filter(isOnSheet).length).toBeGreaterThan(162);
		const told = [...numbers].filter(Boolean).sort((a, b) => a - b);
		expect(told).toEqual(told.map((_, i) => i + 1));
		const list = drawing.texts.filter(({ layer }) => layer === 'collar').map(({ text }) => text);
		numbers.forEach((number, region) => {
			if (number) expect(list[list.indexOf(String(number)) + 1]).toBe(drawing.fills[region].name);
		});
		expect(overlapping(drawing.texts)).toEqual([]);
		expect(crossings(drawing)).toBe(0);
	});

	it('stand off a chain of small islands by leaders that do not cross', async () => {
		const drawing = drawSheet(await islandsSheet());
		const { how } = drawing.lettering;
		expect(how.filter((one) => one === 'leader' || one === 'beside').length).toBeGreaterThan(10);
		expect(crossings(drawing)).toBe(0);
		expect(overlapping(drawing.texts)).toEqual([]);
	});

	it('are in one size, the one asked for, and under 5 pt that is told', () => {
		for (const sizePt of [4, 8]) {
			const drawing = drawSheet(lettered(statesSheet(), { sizePt }));
			const sizes = drawing.texts.flatMap((text) => (text.layer === 'label' ? text.size : []));
			expect(new Set(sizes)).toEqual(new Set([Math.round((sizePt * 2540) / 72)]));
			expect(drawing.lettering.notes.some((note) => note.includes('hard to read'))).toBe(
				sizePt < 5,
			);
		}
	});

	it('put first get their place, and an abbreviation stands where the name has no room', async () => {
		const sheet = await tavaroeSheet(false);
		const plain = drawSheet(sheet);
		const homeless = plain.unplaced.map((region) => sheet.coverage.keys[region]);
		const short = Object.fromEntries(homeless.map((key) => [key, 'Ab']));
		const drawing = drawSheet(lettered(sheet, { abbreviations: short }));
		expect(drawing.unplaced.length).toBeLessThan(plain.unplaced.length / 2);
		const set = drawing.lettering.short.reduce((sum, one) => sum + one, 0);
		expect(set).toBeGreaterThan(plain.unplaced.length / 2);
	});
});

describe('names by hand', () => {
	it('stand where they were put, others keep clear of them, and a leader runs to one far off', () => {
		const sheet = statesSheet();
		const place = { dxMm: 12, dyMm: -31, lines: 1, short: false } as const;
		const region = sheet.coverage.names.indexOf('Montana');
		const drawing = drawSheet(
			lettered(sheet, { placed: { [sheet.coverage.keys[region]]: place } }),
		);
		const [x, y] = drawing.lettering.anchors.subarray(2 * region, 2 * region + 2);
		const [label, ...more] = labelsOf(drawing, region);
		expect(more).toEqual([]);
		expect(Math.abs(label.x + label.width / 2 - (x + 1200))).toBeLessThan(2);
		expect(Math.abs(label.y - 0.255 * label.size - (y - 3100))).toBeLessThan(5);
		expect(drawing.lettering.how[region]).toBe('hand');
		expect(overlapping(drawing.texts)).toEqual([]);
		const before = drawSheet(sheet).lines.find(({ rank }) => rank === 'leader')?.arcs.length ?? 0;
		expect(drawing.lines.find(({ rank }) => rank === 'leader')!.arcs.length).toBe(before + 1);
	});

	it('stay with their region on another paper, are told when they overlap, and are hidden when asked', () => {
		const sheet = statesSheet();
		const key = (name: string) => sheet.coverage.keys[sheet.coverage.names.indexOf(name)];
		const at = { dxMm: 0, dyMm: 0, lines: 1, short: false } as const;
		const hand = { placed: { [key('Kansas')]: at, [key('Missouri')]: at }, hidden: [key('Ohio')] };
		const large = lettered(sheet, hand);
		large.layout.paper = 'A2';
		const drawing = drawSheet(large);
		const kansas = sheet.coverage.names.indexOf('Kansas');
		expect(labelsOf(drawing, kansas)[0].onFill).toBe(true);
		const ohio = sheet.coverage.names.indexOf('Ohio');
		expect(drawing.lettering.how[ohio]).toBe('hidden');
		expect(labelsOf(drawing, ohio)).toEqual([]);
		expect(drawing.lettering.notes).toEqual([]);
		const { anchors } = drawSheet(sheet).lettering;
		const missouri = sheet.coverage.names.indexOf('Missouri');
		const [dxMm, dyMm] = [0, 1].map(
			(axis) => (anchors[2 * kansas + axis] - anchors[2 * missouri + axis]) / 100,
		);
		const over = { [key('Kansas')]: at, [key('Missouri')]: { ...at, dxMm, dyMm } };
		const { notes } = drawSheet(lettered(sheet, { placed: over })).lettering;
		expect(notes.join()).toContain('Names set by hand overlap: Kansas with Missouri');
	});
});

/** Real names. Sources: the municipalities' own spelling; composed and decomposed forms by Unicode 15. */
const greek = ['Αθήνα', 'Θεσσαλονίκη', 'Πάτρα', 'Ηράκλειο', 'Λάρισα', 'Ιωάννινα'];
const cyrillic = ['Київ', 'Харків', 'Одеса', 'Дніпро', 'Запоріжжя', 'Їжакове'];
const latin = ['Łódź', 'Šiauliai', 'Çeşme', 'Ñuñoa', 'Győr', 'Vi\u0301k'];
const others = ['北京', 'القاهرة', 'ירושלים', 'मुंबई', 'Ἀθῆναι', 'Q̇amishlo'];

describe('scripts', () => {
	it.each([
		['Greek', greek],
		['Cyrillic', cyrillic],
		['Latin', latin],
	])('%s names are drawn with letters that the fonts have', async (_, names) => {
		const drawing = drawSheet(await namedSheet(names));
		expect(drawing.lettering.notes).toEqual([]);
		expect(drawing.unplaced).toEqual([]);
		const labels = drawing.texts.filter(({ layer }) => layer === 'label');
		for (const { face, text } of labels) expect(isSetIn(face, text)).toBe(true);
		expect(new Set(labels.map(({ text }) => text))).toEqual(
			new Set(names.map((name) => name.normalize('NFC'))),
		);
	});

	it('that the fonts lack are told and not drawn as boxes', async () => {
		const drawing = drawSheet(await namedSheet(others));
		expect(drawing.lettering.how).toEqual(others.map(() => 'letters'));
		expect(drawing.texts.filter(({ layer }) => layer === 'label')).toEqual([]);
		expect(drawing.lettering.notes[0]).toContain(
			"6 names have letters that the sheet's fonts (Latin, Greek, Cyrillic) lack",
		);
	});
});

describe('proposed abbreviations', () => {
	it('cut words that many names share, then long ones, and leave short names alone', () => {
		const names = ['North Marrow', 'North Dell', 'North Thorn', 'Corvembrandt', 'Yst', ''];
		expect(proposeAbbreviations(names)).toEqual([
			'N. Marrow',
			'N. Dell',
			'N. Thorn',
			'Corv.',
			null,
			null,
		]);
	});
});
