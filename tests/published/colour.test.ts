import { describe, expect, it } from 'vitest';
import {
	asSeenBy,
	ciede2000,
	contrast,
	labelInk,
	labOf,
	luminance,
	oklabOf,
	type Triple,
} from '../../src/lib/engines/colour/index.ts';
import sharma from './values/ciede2000-sharma-34.json';
import readerValues from './values/colour-readers.json';
import wcag from './values/wcag-contrast.json';

describe('CIEDE2000', () => {
	// Sharma, Wu, Dalal 2005, Color Research & Application 30(1) 21-30, Table 1: all 34 pairs
	it.each(sharma.pairs)('gives the published difference of pair $pair in both orders', (row) => {
		const [one, two] = [row.lab1 as unknown as Triple, row.lab2 as unknown as Triple];
		expect(Math.abs(ciede2000(one, two) - row.de00)).toBeLessThanOrEqual(sharma.tolerance);
		expect(Math.abs(ciede2000(two, one) - row.de00)).toBeLessThanOrEqual(sharma.tolerance);
	});

	it('has all 34 pairs to check', () => {
		expect(sharma.pairs).toHaveLength(34);
	});
});

describe('other readers', () => {
	// matrices of Machado, Oliveira, Fernandes 2009 at severity 1.0, on linear sRGB, then clipped
	it.each(readerValues.values)('sees $hex as the published model does', (row) => {
		expect(asSeenBy(row.hex, 'protan')).toBe(row.protan);
		expect(asSeenBy(row.hex, 'deutan')).toBe(row.deutan);
		expect(asSeenBy(row.hex, 'tritan')).toBe(row.tritan);
		expect(asSeenBy(row.hex, 'typical')).toBe(row.hex);
	});

	it.each(readerValues.values)('prints $hex in the grey of its own L*', (row) => {
		const grey = labOf(asSeenBy(row.hex, 'grey'));
		// half a step of 8 bits is at most 0.25 in L*
		expect(Math.abs(grey[0] - row.lab[0])).toBeLessThan(0.25);
		expect(Math.hypot(grey[1], grey[2])).toBeLessThan(1e-3);
	});
});

describe('spaces', () => {
	// definitions: CIE 15:2004 and Ottosson 2020; the values are checked a second way by culori beside the engine
	it.each(readerValues.values)('places $hex in CIELAB D65 and OKLab', (row) => {
		labOf(row.hex).forEach((value, i) => expect(value).toBeCloseTo(row.lab[i], 2));
		oklabOf(row.hex).forEach((value, i) => expect(value).toBeCloseTo(row.oklab[i], 4));
	});
});

describe('contrast', () => {
	// WCAG 2.2, and the examples of "Understanding success criterion 1.4.11"
	it.each(wcag.known)('of $a on $b is $ratio', ({ a, b, ratio }) => {
		expect(contrast(a, b)).toBeCloseTo(ratio, 3);
		expect(contrast(b, a)).toBe(contrast(a, b));
	});

	it.each(readerValues.values)('has the published luminance and label contrast of $hex', (row) => {
		expect(luminance(row.hex)).toBeCloseTo(row.Y, 4);
		expect(contrast(row.hex, '#000000')).toBeCloseTo(row.contrastBlack, 2);
		expect(contrast(row.hex, '#ffffff')).toBeCloseTo(row.contrastWhite, 2);
	});

	it('finds a label ink of at least 4.58:1 on every grey, and the worst one where it is known', () => {
		const ratios = Array.from({ length: 256 }, (_, grey) => {
			const hex = `#${grey.toString(16).padStart(2, '0').repeat(3)}`;
			return contrast(hex, labelInk(hex));
		});
		expect(Math.min(...ratios)).toBeGreaterThanOrEqual(wcag.bounds.bestOfBlackWhiteWorstCase);
	});
});
