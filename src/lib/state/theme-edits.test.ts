import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { moved, parted, stepped } from './theme-edits';

const figures = [1, 2, 2, 5, 9, 14, 30, 80];

describe('limits moved by hand', () => {
	it('stay between the limits beside them', () => {
		expect(moved([5, 20], 0, 9)).toEqual([9, 20]);
		expect(moved([5, 20], 0, 20)).toEqual([5, 20]);
		expect(moved([5, 20], 1, 5)).toEqual([5, 20]);
	});

	it('step past one figure to a round place', () => {
		expect(stepped([5, 20], 0, 1, figures)).toEqual([10, 20]);
		expect(stepped([5, 20], 0, -1, figures)[0]).toBeLessThan(5);
		expect(stepped([5, 20], 1, 1, figures)).toEqual([5, 50]);
		expect(stepped([5, 50], 1, 1, figures)).toEqual([5, 50]);
	});

	it('part the class with most figures in half', () => {
		expect(parted([10], figures)).toEqual([4, 10]);
		expect(parted([], [4, 4, 4])).toEqual([]);
	});

	it('ascend whatever is done to them', () => {
		const list = fc.array(fc.integer({ min: 0, max: 500 }), { minLength: 2, maxLength: 40 });
		const moves = fc.array(fc.tuple(fc.nat(11), fc.integer({ min: -12, max: 12 })), {
			maxLength: 12,
		});
		fc.assert(
			fc.property(list, moves, (values, steps) => {
				let breaks: number[] = [];
				for (const [place, by] of steps) {
					breaks = parted(breaks, values);
					if (place < breaks.length) breaks = stepped(breaks, place, by, values);
					expect(breaks.every((limit, i) => i === 0 || limit > breaks[i - 1])).toBe(true);
				}
			}),
		);
	});
});
