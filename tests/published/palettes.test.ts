import { describe, expect, it } from 'vitest';
import {
	ciede2000,
	labOfLinear,
	linearOf,
	readHex,
	tritanSecondOpinion,
} from '../../src/lib/engines/colour/index.ts';
import {
	checkPalette,
	publishedPalettes,
	readers,
	verdictSentence,
	type Reader,
} from '../../src/lib/engines/palettes/index.ts';
import fillSets from './values/map-fill-sets.json';

/** The least CIEDE2000 of any two inks for one reader. */
function least(hexes: readonly string[], reader: Reader): number {
	const { pairs } = checkPalette(hexes, 'all');
	return Math.min(...pairs.filter((pair) => pair.reader === reader).map((pair) => pair.ciede2000));
}

function publishedPalette(id: string) {
	const palette = publishedPalettes.find((one) => one.id === id);
	return palette ?? expect.fail(`no palette ${id}`);
}

// Minima computed apart from this product with the matrices of Machado et al. 2009, Brettel et al. 1997
// (libDaltonLens) and CIEDE2000 on Lab D65; kept to two decimals (Brettel: one).
describe('map fill sets', () => {
	it.each(fillSets.sets)('$set has the recorded minima', (set) => {
		expect(least(set.hex, 'typical')).toBeCloseTo(set.normal, 1);
		expect(least(set.hex, 'protan')).toBeCloseTo(set.machado[0], 1);
		expect(least(set.hex, 'deutan')).toBeCloseTo(set.machado[1], 1);
		expect(least(set.hex, 'tritan')).toBeCloseTo(set.machado[2], 1);
		expect(least(set.hex, 'grey')).toBeCloseTo(set.grey, 1);
		const gaps = checkPalette(set.hex, 'all').pairs.map((pair) => pair.greyGap);
		expect(Math.min(...gaps)).toBeCloseTo(set.dL, 1);
	});

	it.each(fillSets.sets)('$set has the recorded minimum by the second opinion on tritan', (set) => {
		const seen = set.hex.map((hex) => labOfLinear(tritanSecondOpinion(linearOf(hex))));
		const all = seen.flatMap((one, i) => seen.slice(0, i).map((two) => ciede2000(one, two)));
		expect(Math.abs(Math.min(...all) - set.brettel[2])).toBeLessThan(0.06);
	});
});

describe('published palettes', () => {
	// minimum over typical, protan, deutan and tritan, measured apart from this product
	it.each([
		['okabe-ito', 8, 10.9],
		['tol-bright', 7, 8.6],
		['petroff-10', 10, 11.9],
	])('%s of %i inks reaches %d over four kinds of eyesight', (id, count, minimum) => {
		const hexes = publishedPalette(id).inks.map((ink) => ink.hex);
		expect(hexes).toHaveLength(count);
		const four = readers.filter((reader) => reader !== 'grey').map((one) => least(hexes, one));
		expect(Math.min(...four)).toBeCloseTo(minimum, 1);
	});

	it.each(['brewer-set2', 'brewer-dark2', 'brewer-paired', 'brewer-set3', 'brewer-accent'])(
		'%s at full length is told to fail, and by which pair',
		(id) => {
			const { inks } = publishedPalette(id);
			const verdict = checkPalette(
				inks.map((ink) => ink.hex),
				'all',
			);
			expect(verdict.passes).toBe(false);
			expect(Math.min(...verdict.pairs.map((pair) => pair.ciede2000))).toBeLessThan(2.2);
			expect(verdictSentence(verdict, inks)).toMatch(/^[A-Z][\w ]+ and [A-Z][\w ]+ look alike to /);
		},
	);

	it('each names its source and licence and has sound, distinct inks', () => {
		expect(new Set(publishedPalettes.map((palette) => palette.id)).size).toBe(19);
		for (const { id, inks, source, licence } of publishedPalettes) {
			expect(id).toMatch(/^[a-z0-9-]+$/);
			expect(source && licence).toBeTruthy();
			expect(new Set(inks.map((ink) => ink.name)).size).toBe(inks.length);
			expect(new Set(inks.map((ink) => ink.hex)).size).toBe(inks.length);
			for (const { hex } of inks) expect(readHex(hex)).toBe(hex);
		}
	});
});
