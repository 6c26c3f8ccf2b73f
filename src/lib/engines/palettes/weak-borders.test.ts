import { expect, it } from 'vitest';
import type { BorderList } from '../borders/border-list.ts';
import { bordersSentence, checkPalette, verdictSentence, weakBorders } from './index.ts';

/** Red and brown of one published set: a protan reader sees 3.1 between them. */
const inks = ['#e41a1c', '#a65628', '#377eb8'];
const named = ['Poppy', 'Leather', 'Lake'].map((name, i) => ({ name, hex: inks[i] }));

function bordersOf(pairs: [number, number, number?][]): BorderList {
	return {
		a: Uint32Array.from(pairs, ([a]) => a),
		b: Uint32Array.from(pairs, ([, b]) => b),
		kind: Uint8Array.from(pairs, ([, , kind]) => kind ?? 0),
		metres: new Float64Array(pairs.length),
		at: new Float64Array(2 * pairs.length),
	};
}

const borders = bordersOf([
	[0, 1],
	[0, 2],
	[1, 2],
	[2, 3],
	[0, 3, 1],
]);
const sheet = { borders, colouring: [0, 1, 2, 2], inks, sizesMm: [12, 20, 7, 7] };

it('names the borders where the inks are too alike, with reader, value and severity', () => {
	const weak = weakBorders(sheet);
	const protan = weak.find((one) => one.reader === 'protan');
	expect(protan).toMatchObject({ border: 0, asked: 10, severity: 'error' });
	expect(protan?.found).toBeCloseTo(3.1, 1);
	expect(new Set(weak.map((one) => one.border)).has(3)).toBe(false);
});

it('asks for more where the smaller region is smaller on the sheet', () => {
	const near = checkPalette([inks[0], inks[2]], 'all').pairs;
	const least = Math.min(...near.filter((p) => p.reader !== 'grey').map((p) => p.ciede2000));
	const tight = ['#8a8c8a', '#72b2ff'];
	const one = { borders: bordersOf([[0, 1]]), colouring: [0, 1], inks: tight };
	expect(least).toBeGreaterThan(15);
	const eyes = (mm: number) =>
		weakBorders({ ...one, sizesMm: [mm, 90] }).filter((weak) => weak.reader !== 'grey');
	const alike = ['#8a8c8a', '#7b8b96'];
	const asked = (mm: number) =>
		weakBorders({ ...one, inks: alike, sizesMm: [90, mm] }).find((w) => w.reader === 'deutan')
			?.asked;
	expect(eyes(3)).toEqual([]);
	expect([asked(11), asked(6), asked(2)]).toEqual([10, 12, 15]);
});

it('warns in grey print, never more', () => {
	const grey = weakBorders(sheet).filter((one) => one.reader === 'grey');
	expect(grey.length).toBeGreaterThan(0);
	expect(grey.every((one) => one.severity === 'warning' && one.asked === 5)).toBe(true);
});

it('leaves out point touches unless they count, borders struck out, and regions without ink', () => {
	const points = bordersOf([[0, 1, 1]]);
	const one = { ...sheet, borders: points };
	expect(weakBorders(one)).toEqual([]);
	expect(weakBorders({ ...one, pointTouches: true })).not.toEqual([]);
	expect(weakBorders({ ...one, pointTouches: true, struck: new Set([0]) })).toEqual([]);
	expect(weakBorders({ ...one, pointTouches: true, colouring: [0, -1] })).toEqual([]);
});

it('says it in one sentence', () => {
	const colouring = [0, 1, 0, 1];
	const ring = bordersOf([
		[0, 1],
		[1, 2],
		[2, 3],
	]);
	const weak = weakBorders({ ...sheet, borders: ring, colouring });
	expect(bordersSentence(weak, ring, colouring, named)).toBe(
		'Poppy and Leather look alike to protan and deutan readers and in grey print along 3 borders',
	);
	expect(bordersSentence([], ring, colouring, named)).toBe(
		'Every reader can tell apart all inks that touch',
	);
});

it('says of a palette alone which pair is worst, and which label fails', () => {
	expect(verdictSentence(checkPalette(inks, 'all'), named)).toMatch(
		/^Poppy and Leather look alike to protan/,
	);
	const strict = checkPalette(['#777777'], 'all', { label: 4.7 });
	expect(verdictSentence(strict, [{ name: 'Ash', hex: '#777777' }])).toBe(
		'The best label on Ash reaches a contrast of only 4.68:1',
	);
});
