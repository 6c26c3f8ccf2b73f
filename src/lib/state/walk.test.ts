import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nearestRegion, step, type Direction } from './walk';

// a grid of 3 by 3, numbered in reading order, one apart
const grid = Array.from({ length: 9 }, (_, place) => [place % 3, Math.floor(place / 3)]).flat();
const around = [0, 1, 2, 3, 5, 6, 7, 8];

describe('step', () => {
	it('goes straight where it can', () => {
		expect(step(4, 'left', grid, around)).toBe(3);
		expect(step(4, 'right', grid, around)).toBe(5);
		expect(step(4, 'up', grid, around)).toBe(1);
		expect(step(4, 'down', grid, around)).toBe(7);
	});

	it('stays at the edge', () => {
		expect(step(0, 'left', grid, [1, 3])).toBe(-1);
	});

	it('crosses to a region that touches nothing', () => {
		expect(step(0, 'right', [0, 0, 50, 5], [])).toBe(1);
	});

	it('never goes backward', () => {
		const place = fc.tuple(fc.integer({ min: -99, max: 99 }), fc.integer({ min: -99, max: 99 }));
		const way = fc.constantFrom<Direction>('left', 'right', 'up', 'down');
		fc.assert(
			fc.property(fc.array(place, { minLength: 2, maxLength: 30 }), way, (places, direction) => {
				const to = step(0, direction, places.flat(), []);
				if (to < 0) return;
				const axis = direction === 'left' || direction === 'right' ? 0 : 1;
				const sign = direction === 'left' || direction === 'up' ? -1 : 1;
				expect(sign * (places[to][axis] - places[0][axis])).toBeGreaterThanOrEqual(0);
			}),
		);
	});
});

describe('nearestRegion', () => {
	it('finds the middle', () => {
		expect(nearestRegion(grid, 1.2, 0.9)).toBe(4);
		expect(nearestRegion([], 0, 0)).toBe(-1);
	});
});
