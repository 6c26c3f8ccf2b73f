import { describe, expect, it } from 'vitest';
import { borderKinds, bordersForSheet, type BorderList } from './index.ts';

const keys = ['a', 'b', 'c', 'd'];
/** a-b line, a-d point, b-c water */
const borders: BorderList = {
	a: Uint32Array.of(0, 0, 1),
	b: Uint32Array.of(1, 3, 2),
	kind: Uint8Array.of(0, 1, 2),
	metres: Float64Array.of(10, 0, 30),
	at: Float64Array.of(1, 2, 3, 4, 5, 6),
};
const none = { pointTouches: false, struck: [], added: [] };

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
	it('a point touch added by hand counts even where point touches do not', () => {
		const list = bordersForSheet(keys, borders, { ...none, added: [{ a: 'a', b: 'd' }] });
		expect(listed(list)).toContain('a-d hand');
	});
});
