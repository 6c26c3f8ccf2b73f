import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkClasses } from './classing/check-classes.ts';
import { addsUp, judgeMeasure } from './count-or-rate.ts';
import { limitsHold, limitsOf, themeClasses } from './theme-classes.ts';
import { themeFigures } from './theme-figures.ts';
import { classMethods, type Theme } from './theme.ts';

const theme: Theme = {
	measure: 'visits',
	per: { kind: 'none' },
	isRate: false,
	method: 'quantiles',
	classes: 3,
	breaks: [],
	rounded: true,
	ramp: 'viridis',
	reversed: false,
	middle: null,
	suppressBelow: null,
	title: '',
};

describe('figures of a theme', () => {
	const values = [120, 3, null, 0, 40];
	const areasKm2 = [10, 2, 5, 5, 0];

	it('are divided by area, and not told where there is none', () => {
		const told = themeFigures(
			{ ...theme, per: { kind: 'area' } },
			{ values, areasKm2, denominators: null },
		);
		expect(told.figures).toEqual([12, 1.5, null, 0, null]);
		expect(told.noData).toEqual([2, 4]);
		expect(told.noDenominator).toEqual([4]);
	});

	it('are divided by another measure times a number', () => {
		const per = { kind: 'measure', measure: 'people', times: 1000 } as const;
		const denominators = [60_000, 0, 10, 500, null];
		const told = themeFigures({ ...theme, per }, { values, areasKm2, denominators });
		expect(told.figures).toEqual([2, null, null, 0, null]);
		expect(told.noDenominator).toEqual([1, 4]);
	});

	it('are not told where next to nothing divides them, and can still be parted', () => {
		const ground = { values: [1e300, 1, 2, 3], areasKm2: [1e-20, 1, 1, 1], denominators: null };
		const perArea = { ...theme, per: { kind: 'area' } } as const;
		expect(themeFigures(perArea, ground)).toMatchObject({
			...{ figures: [null, 1, 2, 3], noData: [0], noDenominator: [0] },
		});
		for (const method of classMethods)
			expect(limitsOf({ ...perArea, method }, ground).every(Number.isFinite)).toBe(true);
	});

	it('are suppressed where the count is small, before they are divided, and nought is told', () => {
		const told = themeFigures(
			{ per: { kind: 'area' }, suppressBelow: 5 },
			{ values, areasKm2, denominators: null },
		);
		expect(told.suppressed).toEqual([1]);
		expect(told.figures).toEqual([12, null, null, 0, null]);
	});
});

describe('classes of a theme', () => {
	const count = fc.option(fc.integer({ min: 0, max: 200 }));
	const asked = fc.record({
		values: fc.array(count, { minLength: 1, maxLength: 40 }),
		method: fc.constantFrom(...classMethods),
		classes: fc.integer({ min: 2, max: 12 }),
		suppressBelow: fc.option(fc.integer({ min: 1, max: 20 })),
	});

	it('pass the checker, count every region once and never class a suppressed one', () => {
		fc.assert(
			fc.property(asked, ({ values, ...choices }) => {
				const ground = { values, areasKm2: values.map(() => 1), denominators: null };
				const first: Theme = { ...theme, ...choices };
				const made = { ...first, breaks: limitsOf(first, ground) };
				const { figures, classes, limits, counts, suppressed, noData, ranges } = themeClasses(
					made,
					ground,
				);
				expect(checkClasses(figures, classes, limits)).toEqual([]);
				const classed = counts.reduce((sum, one) => sum + one, 0);
				expect(classed + suppressed.length + noData.length).toBe(values.length);
				for (const region of suppressed) expect(classes[region]).toBe(ranges.length + 1);
				for (const region of noData) expect(classes[region]).toBe(ranges.length);
				expect(limitsHold(made, ground)).toBe(true);
			}),
		);
	});

	it('are told to be of other figures once the figures have changed', () => {
		const ground = {
			values: [1, 2, 3, 40, 50, 60],
			areasKm2: [1, 1, 1, 1, 1, 1],
			denominators: null,
		};
		const made = { ...theme, breaks: limitsOf(theme, ground) };
		expect(limitsHold(made, { ...ground, values: [1, 2, 3, 4, 5, 6] })).toBe(false);
		expect(limitsHold({ ...made, method: 'by-hand' }, { ...ground, values: [9] })).toBe(true);
	});
});

// rules of the house, no source
describe('counts and rates', () => {
	it.each([
		['Accounts', '', [3, 12, 0, null], 'count'],
		['Field hours', 'h', [3.5, 12.25], 'amount'],
		['Turnover', 'EUR', [1200.5, 90], 'amount'],
		['Visits', 'per week', [3, 12], 'count'],
		['Visits per head', '', [2, 3], 'rate'],
		['Share of members', '%', [10, 20], 'rate'],
		['Potential', '', [0.25, 0.75], 'unknown'],
		['Is served', '', [0, 1, 1], 'unknown'],
	] as const)('%s in "%s" is taken for a %4$s', (name, unit, values, kind) => {
		const judged = judgeMeasure(name, unit, values);
		expect(judged.kind).toBe(kind);
		expect(addsUp(judged)).toBe(kind === 'count' || kind === 'amount');
	});
});
