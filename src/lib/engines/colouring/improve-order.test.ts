import { describe, expect, it } from 'vitest';
import { filledUp } from './improve-even.ts';
import { GoalOrder } from './improve-order.ts';

// no source: what is held here is this project's own rule for goals in an order

describe('goals in an order', () => {
	const order = (give: number, start = [100, 100]) => new GoalOrder(start, [give, 0], () => 0);

	it('lets a later goal gain only what costs the earlier one nothing', () => {
		const strict = order(0);
		expect(strict.note([60, 200])).toBe(true);
		expect(strict.note([61, 10])).toBe(false);
		expect(strict.note([60, 150])).toBe(true);
		expect(strict.kept).toEqual([60, 150]);
	});

	it('lets it take the share of the gain that is given away, and no more', () => {
		const giving = order(0.25);
		giving.note([60, 200]);
		expect(giving.limit(0)).toBe(70);
		expect(giving.note([70, 120])).toBe(true);
		expect(giving.note([71, 10])).toBe(false);
		expect(giving.note([65, 121])).toBe(false);
	});

	it('goes back within the limit when the earlier goal is found to gain more', () => {
		const giving = order(0.25);
		giving.note([60, 200]);
		giving.note([70, 120]);
		expect(giving.note([20, 300])).toBe(true);
		expect(giving.limit(0)).toBe(40);
		expect(giving.note([40, 250])).toBe(true);
	});

	it('never lets an earlier goal end worse than it began', () => {
		const giving = order(1);
		expect(giving.note([101, 0])).toBe(false);
		expect(giving.note([100, 50])).toBe(true);
	});
});

describe('the evenest loads above what is locked', () => {
	it('fill up to one level, in whole regions by count', () => {
		expect(filledUp([0, 0, 0, 0], 3_231, true).sort()).toEqual([807, 808, 808, 808]);
		expect(filledUp([5, 0, 0], 8, true)).toEqual([5, 2, 1]);
		expect(filledUp([5, 0, 0], 8, false)).toEqual([5, 1.5, 1.5]);
		expect(filledUp([2, 2], 4, true)).toEqual([2, 2]);
	});
});
