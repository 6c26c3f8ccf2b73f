import { describe, expect, it } from 'vitest';
import type { SheetBorderRow } from '../engines/borders/index.ts';
import { blankDraft } from '../../../tests/support/blank-draft';
import { borderRowFilter, type BorderQuestion } from './border-filter';
import { addBorders, strike, takeBack } from './draft-edits';
import { pieceRows, pieceWords } from './piece-rows';

const keys = ['n1', 'n2', 'n3', 'n4'];
const names = ['North', 'South', 'Northey', 'West'];
const row = (change: Partial<SheetBorderRow>): SheetBorderRow => ({
	...{ a: 0, b: 1, border: 0, kind: 0, metres: 100, standing: 'counts', hand: null },
	...change,
});
const rows = [
	row({}),
	row({ a: 1, b: 2, kind: 1, metres: 0, standing: 'point-not-counted' }),
	row({ a: 1, b: 3, kind: 4, metres: 5_000, standing: 'too-far' }),
	row({ a: 2, b: 3, standing: 'struck', hand: { what: 'struck', reason: 'a wall' } }),
];
const asked = (question: Partial<BorderQuestion>) => {
	const whole = { kind: 'any', standing: 'any', region: '', least: null, most: null } as const;
	const fits = borderRowFilter({ ...whole, ...question }, keys, (region) => names[region]);
	return rows.flatMap((one, i) => (fits(one) ? [i] : []));
};

describe('the borders asked for', () => {
	it('are found by kind, standing, region and metres, alone and together', () => {
		expect(asked({})).toEqual([0, 1, 2, 3]);
		expect(asked({ kind: 'across water' })).toEqual([2]);
		expect(asked({ standing: 'counts' })).toEqual([0]);
		expect(asked({ standing: 'not' })).toEqual([1, 2, 3]);
		expect(asked({ standing: 'hand' })).toEqual([3]);
		expect(asked({ region: 'n1' })).toEqual([0]);
		expect(asked({ region: ' north' })).toEqual([0, 1, 3]);
		expect(asked({ least: 100, most: 100 })).toEqual([0, 3]);
		expect(asked({ region: 'west', least: 1_000 })).toEqual([2]);
		expect(asked({ region: 'nowhere' })).toEqual([]);
	});
});

describe('deciding about several borders at once', () => {
	const pairs = [
		{ a: 'n2', b: 'n1' },
		{ a: 'n2', b: 'n3' },
	];
	it('strikes them out with one reason, and takes them back as one', () => {
		const struck = strike(pairs, 'a wall', 'Ada')(blankDraft());
		expect(struck.struck).toMatchObject([
			{ a: 'n1', b: 'n2', reason: 'a wall', by: 'Ada' },
			{ a: 'n2', b: 'n3', reason: 'a wall', by: 'Ada' },
		]);
		expect(strike(pairs, 'again')(struck).struck).toHaveLength(2);
		expect(takeBack([pairs[0]])(struck).struck).toHaveLength(1);
		expect(takeBack(pairs)(struck)).toEqual(blankDraft());
	});
	it('lets them count, struck or not, each once', () => {
		const struck = strike([pairs[0]], 'a wall')(blankDraft());
		const added = addBorders(pairs, 'a bridge')(addBorders([pairs[1]], 'a ferry')(struck));
		expect(added.struck).toEqual([]);
		expect(added.added.map(({ reason }) => reason)).toEqual(['a bridge', 'a bridge']);
		expect(strike(pairs, 'no more')(added)).toMatchObject({ added: [], struck: [] });
	});
});

describe('pieces in words', () => {
	it('are counted by region and say what they are', () => {
		const list = pieceRows({
			...{ region: [0, 0, 2, 3], part: [1, 0, 0, 0], kind: ['main', 'exclave', 'island', 'main'] },
			...{ areaKm2: [9, 1, 4, 2], lon: [0, 0, 0, 0], lat: [0, 0, 0, 0], within: [-1, 3, -1, 0] },
		});
		expect(list.map(({ rank, of }) => `${rank} of ${of}`)).toEqual([
			...['1 of 2', '2 of 2', '1 of 1', '1 of 1'],
		]);
		expect(list.map(pieceWords)).toEqual(['main part', 'exclave, enclave', 'island', 'enclave']);
	});
});
