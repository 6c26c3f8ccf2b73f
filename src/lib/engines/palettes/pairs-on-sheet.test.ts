import { describe, expect, it } from 'vitest';
import type { BorderList } from '../borders/border-list.ts';
import { isUnsafe, pairDemands, pairsOnSheet, weakBorders, type Ink } from './index.ts';

/** Red and brown of one published set: a protan reader sees 3.1 between them. */
const inks: Ink[] = [
	{ name: 'Poppy', hex: '#e41a1c' },
	{ name: 'Leather', hex: '#a65628' },
	{ name: 'Chalk', hex: '#f2f2f2' },
];
const hexes = inks.map(({ hex }) => hex);
const bordersOf = (pairs: [number, number, number?][]): BorderList => ({
	a: Uint32Array.from(pairs, ([a]) => a),
	b: Uint32Array.from(pairs, ([, b]) => b),
	kind: Uint8Array.from(pairs, ([, , kind]) => kind ?? 0),
	metres: new Float64Array(pairs.length),
	at: new Float64Array(2 * pairs.length),
});
const hand = 3;
const sheet = {
	borders: bordersOf([
		[0, 1],
		[0, 2],
		[1, 4, hand],
		[2, 3],
		[3, 4],
	]),
	colouring: [0, 1, 2, 0, 2],
	inks: hexes,
	sizesMm: [12, 11, 6, 4, 2],
};
const look = { lineHex: '#000000', labels: true };

describe('what touching inks are asked for', () => {
	it('is by the smallest region on the borders between them, with the tightest border named', () => {
		expect(pairDemands(sheet)).toEqual([
			{
				a: 0,
				b: 1,
				ciede2000: 10,
				grey: 5,
				borders: 1,
				tightest: 0,
				sizesMm: [12, 11],
				needsMore: false,
			},
			{
				a: 0,
				b: 2,
				ciede2000: 15,
				grey: 5,
				borders: 3,
				tightest: 4,
				sizesMm: [4, 2],
				needsMore: true,
			},
			{
				a: 1,
				b: 2,
				ciede2000: 15,
				grey: 5,
				borders: 1,
				tightest: 2,
				sizesMm: [11, 2],
				needsMore: true,
			},
		]);
	});

	it('holds for pairs joined by hand alone', () => {
		const only = { ...sheet, borders: bordersOf([[0, 1, hand]]) };
		expect(pairDemands(only).map(({ a, b, borders }) => [a, b, borders])).toEqual([[0, 1, 1]]);
		expect(weakBorders(only).some(({ reader }) => reader === 'protan')).toBe(true);
	});

	it('grows with smaller paper', () => {
		const half = { ...sheet, sizesMm: sheet.sizesMm.map((mm) => mm / 3) };
		expect(pairDemands(sheet)[0].ciede2000).toBe(10);
		expect(pairDemands(half)[0]).toMatchObject({ ciede2000: 15, needsMore: false });
	});
});

describe('the verdict on a pair', () => {
	const pair = (change: Partial<Ink>[], labels = true, lineHex = '#000000') =>
		pairsOnSheet(
			inks.map((ink, i) => ({ ...ink, ...change[i] })),
			pairDemands(sheet),
			{ ...look, labels, lineHex },
		);

	it('is an error where a reader sees less than 5', () => {
		const [poppyLeather] = pair([]);
		expect(poppyLeather.mark).toBe('error');
		const protan = poppyLeather.readers.find(({ reader }) => reader === 'protan');
		expect(protan).toMatchObject({ state: 'alike', asked: 10 });
		expect(isUnsafe(poppyLeather)).toBe(true);
	});

	it('in grey print: weak below 5, near below 8, clear from 8', () => {
		// L* of neutral greys; the steps are of the design: warn below 5, pass at 8
		const grey = (hex: string) =>
			pair([{ hex: '#808080' }, { hex }])[0].readers.find(({ reader }) => reader === 'grey');
		expect(grey('#8a8a8a')).toMatchObject({ state: 'weak' });
		expect(grey('#8f8f8f')).toMatchObject({ state: 'near' });
		expect(grey('#989898')).toMatchObject({ state: 'clear' });
	});

	it('lets hatches stand in for colour, reader by reader', () => {
		const hatch = { kind: 'lines', angle: 45, spacingMm: 2, widthMm: 0.3, hex: '#ffffff' } as const;
		const [poppyLeather] = pair([{}, { hatch }]);
		expect(poppyLeather.readers.map(({ state }) => state)).not.toContain('alike');
		expect(poppyLeather.readers.find(({ reader }) => reader === 'protan')?.state).toBe('hatch');
		expect(poppyLeather).toMatchObject({ mark: 'clear', beside: 'hatch' });
		const hatches = [undefined, hatch, undefined];
		const bare = weakBorders(sheet).filter(({ border }) => border === 0);
		expect(bare.length).toBeGreaterThan(0);
		expect(weakBorders({ ...sheet, hatches }).filter(({ border }) => border === 0)).toEqual([]);
	});

	it('asks more than a fill where a region is under 3.5 mm: a label or a hatch', () => {
		expect(pair([])[1]).toMatchObject({ needsMore: true, beside: 'labels', mark: 'clear' });
		expect(pair([], false)[1]).toMatchObject({ beside: 'nothing', mark: 'warning' });
	});

	it('asks 3:1 of the border line against both fills (WCAG 2.2, 1.4.11)', () => {
		const [, poppyChalk] = pair([], true, '#949494');
		expect(poppyChalk.line.passes).toBe(false);
		expect(poppyChalk.mark).toBe('warning');
	});
});
