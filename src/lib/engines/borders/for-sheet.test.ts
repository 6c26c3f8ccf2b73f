import { describe, expect, it } from 'vitest';
import {
	borderKinds,
	bordersForSheet,
	standingsForSheet,
	standingUnder,
	withGaps,
	type BorderList,
	type SheetBorderRules,
} from './index.ts';

const keys = ['a', 'b', 'c', 'd'];
/** a-b line, a-d point, b-c water */
const borders: BorderList = {
	a: Uint32Array.of(0, 0, 1),
	b: Uint32Array.of(1, 3, 2),
	kind: Uint8Array.of(0, 1, 2),
	metres: Float64Array.of(10, 0, 30),
	at: Float64Array.of(1, 2, 3, 4, 5, 6),
};
const none = { pointTouches: false, leastMetres: 0, waterKm: null, struck: [], added: [] };

const listed = (list: BorderList) =>
	Array.from(list.a, (a, i) => `${keys[a]}-${keys[list.b[i]]} ${borderKinds[list.kind[i]]}`);

describe('the borders of a sheet', () => {
	it('count point touches only where asked', () => {
		expect(listed(bordersForSheet(keys, borders, none))).toEqual(['a-b line', 'b-c water']);
		const all = bordersForSheet(keys, borders, { ...none, pointTouches: true });
		expect(listed(all)).toEqual(['a-b line', 'a-d point', 'b-c water']);
		expect(all).toEqual(borders);
	});
	it('leave out those struck, in either order', () => {
		const rules = { ...none, struck: [{ a: 'b', b: 'a' }] };
		expect(listed(bordersForSheet(keys, borders, rules))).toEqual(['b-c water']);
	});
	it('take in those added by hand, once, and pass over keys that are gone', () => {
		const added = [
			{ a: 'd', b: 'c' },
			{ a: 'a', b: 'b' },
			{ a: 'a', b: 'gone' },
			{ a: 'a', b: 'a' },
		];
		const list = bordersForSheet(keys, borders, { ...none, added });
		expect(listed(list)).toEqual(['a-b line', 'b-c water', 'c-d hand']);
		expect(list.metres[0]).toBe(10);
	});
	it('leave out lines shorter than the rule asks, and only lines', () => {
		const rules = { ...none, pointTouches: true };
		expect(listed(bordersForSheet(keys, borders, { ...rules, leastMetres: 10 }))).toEqual([
			'a-b line',
			'a-d point',
			'b-c water',
		]);
		expect(listed(bordersForSheet(keys, borders, { ...rules, leastMetres: 10.5 }))).toEqual([
			'a-d point',
			'b-c water',
		]);
	});
	it('a line too short that is added by hand counts', () => {
		const added = [{ a: 'a', b: 'b' }];
		const list = bordersForSheet(keys, borders, { ...none, leastMetres: 99, added });
		expect(listed(list)).toEqual(['a-b hand', 'b-c water']);
	});
	it('a point touch added by hand counts even where point touches do not', () => {
		const list = bordersForSheet(keys, borders, { ...none, added: [{ a: 'a', b: 'd' }] });
		expect(listed(list)).toContain('a-d hand');
	});
});

describe('gaps measured after the file was read', () => {
	const gaps = {
		a: Uint32Array.of(0, 1, 2),
		b: Uint32Array.of(2, 2, 3),
		metres: Float64Array.of(4_000, 30, 12_000),
		at: Float64Array.of(7, 8, 5, 6, 9, 9),
	};
	const all = withGaps(4, borders, gaps);
	const counting = (rules: Partial<SheetBorderRules>) =>
		listed(bordersForSheet(keys, all, { ...none, ...rules }));

	it('stand in order beside the borders, which keep what they are', () => {
		expect(listed(all)).toEqual(['a-b line', 'a-c gap', 'a-d point', 'b-c water', 'c-d gap']);
		expect([...all.at]).toEqual([1, 2, 7, 8, 3, 4, 5, 6, 9, 9]);
		expect(withGaps(4, borders, { ...gaps, a: new Uint32Array() })).toBe(borders);
	});
	it('count as far as the rule says, and not at all as the file was read', () => {
		expect(counting({})).toEqual(['a-b line', 'b-c water']);
		expect(counting({ waterKm: 0 })).toEqual(['a-b line']);
		expect(counting({ waterKm: 0.02 })).toEqual(['a-b line']);
		expect(counting({ waterKm: 4 })).toEqual(['a-b line', 'a-c water', 'b-c water']);
		expect(counting({ waterKm: 200 })).toHaveLength(4);
	});
	it('are told by why they do not count', () => {
		const rules = { ...none, waterKm: 4, leastMetres: 11, struck: [{ a: 'c', b: 'b' }] };
		expect(standingsForSheet(keys, all, rules)).toEqual([
			'too-short',
			'counts',
			'point-not-counted',
			'struck',
			'too-far',
		]);
	});
});

// the rule said a second time, as a table by hand
it.each([
	['line', 0, { leastMetres: 0 }, 'counts'],
	['line', 4.99, { leastMetres: 5 }, 'too-short'],
	['line', 5, { leastMetres: 5 }, 'counts'],
	['point', 0, { leastMetres: 5, pointTouches: true }, 'counts'],
	['point', 0, {}, 'point-not-counted'],
	['water', 900, {}, 'counts'],
	['gap', 900, {}, 'water-not-counted'],
	['water', 900, { waterKm: 0 }, 'water-not-counted'],
	['water', 900, { waterKm: 0.9 }, 'counts'],
	['gap', 900, { waterKm: 0.9 }, 'counts'],
	['gap', 900.1, { waterKm: 0.9 }, 'too-far'],
	['hand', 0, { leastMetres: 9, waterKm: 0 }, 'counts'],
] as const)('a %s of %d m under %o %s', (kind, metres, rule, standing) => {
	expect(standingUnder({ ...none, ...rule }, borderKinds.indexOf(kind), metres)).toBe(standing);
});
