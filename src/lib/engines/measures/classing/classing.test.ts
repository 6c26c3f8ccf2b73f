import fc from 'fast-check';
import { ckmeans } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { classMethods } from '../theme.ts';
import { checkClasses } from './check-classes.ts';
import { classLimits } from './class-limits.ts';
import { classCounts, classOf } from './class-of.ts';
import { varianceFit } from './goodness.ts';
import { histogram } from './histogram.ts';
import { naturalBreaks } from './natural-breaks.ts';
import { limitWords, rangeWords } from './range-words.ts';
import { roundedLimits } from './rounded-limits.ts';

const figure = fc.oneof(
	fc.integer({ min: -50, max: 50 }),
	fc.double({ min: -1e6, max: 1e6, noNaN: true }),
	fc.constantFrom(0, 1, 7, 1e-9, 3.5),
);
const figures = fc.array(figure, { minLength: 1, maxLength: 60 });
const whole = fc.array(fc.integer({ min: 0, max: 5000 }), { minLength: 1, maxLength: 80 });
const method = fc.constantFrom(...classMethods.filter((one) => one !== 'by-hand'));

/** Least sum of squares over every way of parting sorted values, by trying them all. */
function leastSquares(sorted: number[], classes: number): number {
	if (classes === 1 || sorted.length <= 1) return squares(sorted);
	let best = squares(sorted);
	for (let first = 1; first < sorted.length; first++) {
		const rest = leastSquares(sorted.slice(first), classes - 1);
		best = Math.min(best, squares(sorted.slice(0, first)) + rest);
	}
	return best;
}
function squares(values: number[]): number {
	const centre = values.reduce((a, b) => a + b, 0) / values.length;
	return values.reduce((sum, value) => sum + (value - centre) ** 2, 0);
}
const within = (values: number[], limits: number[]): number =>
	limits
		.concat(Infinity)
		.map((_, one) => values.filter((value) => classOf(value, limits) === one))
		.reduce((sum, group) => sum + (group.length ? squares(group) : 0), 0);

describe('natural breaks', () => {
	it('are as good as the best of every way of parting', () => {
		const few = fc.array(fc.integer({ min: -30, max: 30 }), { minLength: 1, maxLength: 10 });
		fc.assert(
			fc.property(few, fc.integer({ min: 1, max: 5 }), (values, classes) => {
				const sorted = [...values].sort((a, b) => a - b);
				const found = within(values, naturalBreaks(values, classes).slice(0, -1));
				expect(found).toBeCloseTo(leastSquares(sorted, classes), 6);
			}),
		);
	});

	it('part as ckmeans of simple-statistics does, and no equal values', () => {
		fc.assert(
			fc.property(whole, fc.integer({ min: 2, max: 9 }), (values, classes) => {
				const distinct = new Set(values).size;
				const groups = ckmeans(values, Math.min(classes, distinct));
				const limits = naturalBreaks(values, classes).slice(0, -1);
				expect(classCounts(values, limits)).toEqual(groups.map(({ length }) => length));
			}),
		);
	});
});

describe('limits of classes', () => {
	it('ascend, leave no value out, part no equal values, and pass the checker', () => {
		const asked = fc.record({
			method,
			classes: fc.integer({ min: 2, max: 12 }),
			rounded: fc.boolean(),
			breaks: fc.constant([]),
		});
		fc.assert(
			fc.property(figures, asked, (values, classing) => {
				const limits = classLimits(values, classing);
				expect(limits.length).toBeLessThan(classing.classes);
				const classes = values.map((value) => classOf(value, limits));
				expect(checkClasses(values, classes, limits)).toEqual([]);
				expect(Math.min(...classes)).toBe(0);
				expect(Math.max(...classes)).toBe(limits.length);
			}),
		);
	});

	it('are fewer where there are fewer distinct values', () => {
		for (const one of classMethods.filter((each) => each !== 'by-hand')) {
			const limits = classLimits([4, 4, 9, 9, 9], {
				...{ method: one, classes: 6, breaks: [], rounded: false },
			});
			expect(limits.filter((limit) => limit < 9).length).toBe(limits.length);
			expect(classCounts([4, 4, 9, 9, 9], limits)[0]).toBe(2);
			const same = { method: one, classes: 4, breaks: [], rounded: true } as const;
			expect(classLimits([7, 7, 7], same)).toEqual([]);
			expect(classLimits([], same)).toEqual([]);
		}
	});

	it('are told when they are wrong', () => {
		expect(checkClasses([1, 2, null], [0, 1, 2], [1])).toEqual([]);
		expect(checkClasses([1, 2, null], [0, 0, 2], [1])).toHaveLength(1);
		expect(checkClasses([1, 2, null], [0, 1, 1], [1])).toHaveLength(1);
		expect(checkClasses([1], [0], [2, 2])).toHaveLength(1);
		expect(checkClasses([1, 2], [0], [])).toHaveLength(2);
	});
});

describe('rounded limits', () => {
	it('keep every value in its class and ascend', () => {
		const raw = fc
			.uniqueArray(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { maxLength: 8 })
			.map((list) => list.map((one) => one + 0).sort((a, b) => a - b));
		fc.assert(
			fc.property(figures, raw, (values, limits) => {
				const round = roundedLimits(limits, values);
				expect(values.map((value) => classOf(value, round))).toEqual(
					values.map((value) => classOf(value, limits)),
				);
				expect(round.every((limit, i) => i === 0 || limit > round[i - 1])).toBe(true);
			}),
		);
	});

	it('are the roundest there are', () => {
		expect(roundedLimits([1187.3, 3391.2], [100, 1150, 1260, 3380, 3450, 9000])).toEqual([
			1200, 3400,
		]);
		expect(roundedLimits([0.1234], [0.12, 0.13])).toEqual([0.12]);
		expect(roundedLimits([75.29], [75.29, 110.74])).toEqual([100]);
		expect(roundedLimits([0], [-4, 3])).toEqual([0]);
	});
});

describe('range words', () => {
	it('leave the ends open and group thousands', () => {
		expect(rangeWords([1200, 3400])).toEqual(['up to 1,200', '1,200 to 3,400', 'over 3,400']);
		expect(rangeWords([])).toEqual(['all figures']);
		expect(rangeWords([0.125])).toEqual(['up to 0.125', 'over 0.125']);
	});
	it('tell limits apart that hardly differ', () => {
		const words = limitWords([1.00000001, 1.00000002]);
		expect(new Set(words).size).toBe(2);
	});
	it('write what is vast or tiny with an exponent, not as a row of noughts', () => {
		expect(limitWords([-2e20, 2.5e-12, 0, 1e14, 1e308])).toEqual([
			...['-2E20', '2.5E-12', '0', '100,000,000,000,000', '1E308'],
		]);
	});
});

describe('goodness and histogram', () => {
	it('say 1 where every class holds one value only, 0 for one class', () => {
		expect(varianceFit([1, 1, 5, 5, 9], [1, 5])).toBe(1);
		expect(varianceFit([1, 5, 9], [])).toBe(0);
		expect(varianceFit([3, 3], [])).toBe(1);
	});

	it('put every value into one bin', () => {
		fc.assert(
			fc.property(figures, (values) => {
				const { counts, from, width } = histogram(values);
				expect(counts.reduce((a, b) => a + b, 0)).toBe(values.length);
				expect(counts.length).toBeLessThanOrEqual(48);
				expect(from + width * counts.length).toBeCloseTo(Math.max(...values), 3);
			}),
		);
	});

	it('are as wide as Freedman and Diaconis ask', () => {
		// quartiles of 0 to 8 are 2 and 6; 2 * 4 / cbrt(9) = 3.846; 8 / 3.846 = 2.08, so three bins
		expect(histogram([0, 1, 2, 3, 4, 5, 6, 7, 8]).counts).toEqual([3, 3, 3]);
	});
});
