import { differenceCiede2000, lab65, type Rgb } from 'culori';
import { describe, expect, it } from 'vitest';
import type { BorderList } from '../borders/border-list.ts';
import { linearOf, tritanSecondOpinion } from '../colour/index.ts';
import {
	isUnsafe,
	pairDemands,
	pairsOnSheet,
	weakBorders,
	type Ink,
	type SheetFills,
} from './index.ts';

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
const sheet: SheetFills = {
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
const black = { region: '#000000', group: '#000000' };

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
				...{ needsMore: false, bare: 0, ranks: ['region'] },
			},
			{
				a: 0,
				b: 2,
				ciede2000: 15,
				grey: 5,
				borders: 3,
				tightest: 4,
				sizesMm: [4, 2],
				...{ needsMore: true, bare: 1, ranks: ['region'] },
			},
			{
				a: 1,
				b: 2,
				ciede2000: 15,
				grey: 5,
				borders: 1,
				tightest: 2,
				sizesMm: [11, 2],
				...{ needsMore: true, bare: 1, ranks: ['region'] },
			},
		]);
	});

	it('holds for pairs joined by hand alone', () => {
		const only = { ...sheet, borders: bordersOf([[0, 1, hand]]) };
		expect(pairDemands(only).map(({ a, b, borders }) => [a, b, borders])).toEqual([[0, 1, 1]]);
		expect(weakBorders(only).some(({ reader }) => reader === 'protan')).toBe(true);
	});

	it('grows with smaller paper', () => {
		const half = { ...sheet, sizesMm: Array.from(sheet.sizesMm, (mm) => mm / 3) };
		expect(pairDemands(sheet)[0].ciede2000).toBe(10);
		expect(pairDemands(half)[0]).toMatchObject({ ciede2000: 15, needsMore: false });
	});
});

describe('the verdict on a pair', () => {
	const everywhere = { ...sheet, labelled: () => true };
	const pair = (change: Partial<Ink>[], ground: Partial<typeof sheet> = {}, lines = black) =>
		pairsOnSheet(
			inks.map((ink, i) => ({ ...ink, ...change[i] })),
			pairDemands({ ...everywhere, ...ground }),
			lines,
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
		expect(poppyLeather).toMatchObject({ mark: 'clear', beside: null });
		const hatches = [undefined, hatch, undefined];
		const bare = weakBorders(sheet).filter(({ border }) => border === 0);
		expect(bare.length).toBeGreaterThan(0);
		expect(weakBorders({ ...sheet, hatches }).filter(({ border }) => border === 0)).toEqual([]);
	});

	it('asks more than a fill where a region is under 3.5 mm: a label that is there, or a hatch', () => {
		const labelled = (...regions: number[]) => ({ labelled: (r: number) => regions.includes(r) });
		expect(pair([])[1]).toMatchObject({
			needsMore: true,
			bare: 0,
			beside: 'labels',
			mark: 'clear',
		});
		// region 4 shows 2 mm large; the names of all others do not help it
		expect(pair([], labelled(0, 1, 2, 3))[1]).toMatchObject({
			...{ bare: 1, beside: 'nothing', mark: 'warning' },
		});
		expect(pair([], labelled(4))[1]).toMatchObject({ beside: 'labels', mark: 'clear' });
		const hatch = {
			kind: 'lines',
			angle: 45,
			spacingMm: 0.8,
			widthMm: 0.2,
			hex: '#000000',
		} as const;
		const chalkHatched = pair([{}, {}, { hatch }], labelled());
		expect(chalkHatched[1]).toMatchObject({ beside: 'hatch', mark: 'clear' });
	});

	it('asks 3:1 of the border line against both fills (WCAG 2.2, 1.4.11)', () => {
		const [, poppyChalk] = pair([], {}, { ...black, region: '#949494' });
		expect(poppyChalk.line).toMatchObject({ rank: 'region', passes: false });
		expect(poppyChalk.mark).toBe('warning');
	});

	it('asks it of the line that is drawn: between two of the level above it is another', () => {
		const pale = { ...black, group: '#949494' };
		const groups = ['n', 'n', 's', 's', 's'];
		const [poppyLeather, poppyChalk] = pair([], { groups }, pale);
		expect(poppyLeather.line).toMatchObject({ rank: 'region', passes: true });
		expect(poppyChalk.line).toMatchObject({ rank: 'group', passes: false });
	});

	it('notes where an older model of tritan eyesight (Brettel 1997) would not pass a pair', () => {
		const two: Ink[] = [
			{ name: 'Sky blue', hex: '#56b4e9' },
			{ name: 'Bluish green', hex: '#009e73' },
		];
		const doubt = (mm: number, pair = two) => {
			const ground = { borders: bordersOf([[0, 1]]), colouring: [0, 1], sizesMm: [mm, mm] };
			const [judged] = pairsOnSheet(
				pair,
				pairDemands({ ...ground, inks: pair.map(({ hex }) => hex) }),
				black,
			);
			return judged.tritanDoubt;
		};
		// reference library: culori 4.0.2 on what the older model makes of the two
		const [a, b] = two.map(({ hex }) => {
			const [red, green, blue] = tritanSecondOpinion(linearOf(hex));
			return lab65({ mode: 'lrgb', r: red, g: green, b: blue } as unknown as Rgb);
		});
		expect(doubt(7)).toBeCloseTo(differenceCiede2000()(a, b), 3);
		expect(doubt(12)).toBeNull();
		const hatch = { kind: 'lines', angle: 45, spacingMm: 2, widthMm: 0.3, hex: '#000000' } as const;
		expect(doubt(7, [two[0], { ...two[1], hatch }])).toBeNull();
	});
});
