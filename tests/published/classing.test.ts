import { describe, expect, it } from 'vitest';
import { classCounts, classLimits, varianceFit } from '../../src/lib/engines/measures/index.ts';
import { equalSteps } from '../../src/lib/engines/measures/classing/equal-steps.ts';
import { headTail } from '../../src/lib/engines/measures/classing/head-tail.ts';
import { naturalBreaks } from '../../src/lib/engines/measures/classing/natural-breaks.ts';
import { quantiles } from '../../src/lib/engines/measures/classing/quantiles.ts';
import { standardDeviations } from '../../src/lib/engines/measures/classing/standard-deviations.ts';
import table from './values/classing-58-values.json';

// Employment density of 58 counties of California, with limits and counts as the test suite of mapclassify
// (PySAL, BSD-3) publishes them; the file names the source.
const { values, expected } = table;
const most = Math.max(...values);

function expectClasses(found: number[], { upper, counts }: { upper: number[]; counts: number[] }) {
	expect(found).toHaveLength(upper.length);
	found.forEach((limit, i) => expect(limit).toBeCloseTo(upper[i], 5));
	expect(classCounts(values, found.slice(0, -1))).toEqual(counts);
}

describe('58 published values', () => {
	it('are parted by natural breaks as published', () => {
		const found = naturalBreaks(values, 5);
		expectClasses(found, expected.fisherJenks5);
		// absolute deviation about class medians
		const inClass = (one: number) =>
			values.filter((value) => value <= found[one] && (one === 0 || value > found[one - 1]));
		const deviation = found.map((_, one) => {
			const sorted = inClass(one).sort((a, b) => a - b);
			const middle = (sorted[(sorted.length - 1) >> 1] + sorted[sorted.length >> 1]) / 2;
			return sorted.reduce((sum, value) => sum + Math.abs(value - middle), 0);
		});
		expect(deviation.reduce((a, b) => a + b, 0)).toBeCloseTo(expected.fisherJenks5.adcm, 2);
	});

	it('are parted by quantiles as published', () => {
		expectClasses(quantiles(values, 5), expected.quantile5);
	});

	it('are parted in equal steps as published', () => {
		expectClasses(equalSteps(values, 5), expected.equalInterval5);
	});

	it('are parted by standard deviations as published', () => {
		expectClasses([...standardDeviations(values, 5), most], expected.stdMean);
	});

	it('are parted by head and tail as published', () => {
		expectClasses([...headTail(values, 12), most], expected.headTail);
	});

	it('come out the same from the classing of a theme, empty classes at the ends left out', () => {
		const by = { classes: 5, breaks: [], rounded: false };
		const natural = classLimits(values, { ...by, method: 'natural-breaks' });
		expect(natural).toEqual(expected.fisherJenks5.upper.slice(0, -1));
		const deviations = classLimits(values, { ...by, method: 'standard-deviations' });
		expect(deviations).toHaveLength(2);
		expect(varianceFit(values, natural)).toBeGreaterThan(0.99);
	});
});
