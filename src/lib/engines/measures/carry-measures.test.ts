import { describe, expect, it } from 'vitest';
import { gridCells, landOf } from '../../../../tests/support/recut-lands.ts';
import { matchRegions } from '../boundaries/recut/index.ts';
import { carryNumbers, carryTexts } from './index.ts';

const cells = gridCells(2, 4);
const before = await landOf(cells, { a: [0], b: [1], c: [2, 3], d: [4], e: [5], f: [6] });
const after = await landOf(cells, { A: [0], n: [7], c: [2], c2: [3], de: [4, 5], f: [6], bb: [1] });
const match = matchRegions(before, after);

describe('a measure on new boundaries', () => {
	it('has sums where regions are one now and the measure adds up', () => {
		expect(after.keys).toEqual(['A', 'n', 'c', 'c2', 'de', 'f', 'bb']);
		expect(carryNumbers([1, 2, 3, 4, 5, 6], match, true)).toEqual({
			values: [1, null, null, null, 9, 6, 2],
			carried: 3,
			summed: 1,
			empty: 3,
			lost: 2,
		});
	});
	it('has none there where it does not, or where a part has none', () => {
		expect(carryNumbers([1, 2, 3, 4, 5, 6], match, false).values[4]).toBeNull();
		const gaps = carryNumbers([1, NaN, 3, 4, null, 6], match, true);
		expect(gaps).toMatchObject({ values: [1, null, null, null, null, 6, null], lost: 3, empty: 5 });
		expect(carryNumbers([0, 0, 0, 0, 0, 0], match, true).values[4]).toBe(0);
	});
	it('has a text where all parts have the same', () => {
		expect(carryTexts(['x', '', 'y', 'z', 'z', null], match)).toMatchObject({
			values: ['x', null, null, null, 'z', null, ''],
			carried: 3,
			summed: 0,
		});
		expect(carryTexts(['x', null, 'y', 'z', 'w', null], match).values[4]).toBeNull();
	});
	it('refuses a list of other regions', () => {
		expect(() => carryNumbers([1], match, true)).toThrow(RangeError);
	});
	it('changes nothing over the same boundaries', () => {
		const same = matchRegions(before, before);
		expect(carryNumbers([1, 2, null, 4, 5, 6], same, false).values).toEqual([1, 2, null, 4, 5, 6]);
	});
});
