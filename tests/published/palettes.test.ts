import { differenceCiede2000, lab65, type Rgb } from 'culori';
import { describe, expect, it } from 'vitest';
import {
	ciede2000,
	labOfLinear,
	linearOf,
	readHex,
	seenLinear,
	tritanSecondOpinion,
} from '../../src/lib/engines/colour/index.ts';
import {
	checkPalette,
	housePalettes,
	isUnsafe,
	pairDemands,
	pairsOnSheet,
	publishedPalettes,
	readers,
	verdictSentence,
	type Ink,
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

/** A sheet on which every ink touches every other, in regions of 7 mm. */
function onSheet(inks: readonly Ink[]) {
	const pairs = inks.flatMap((_, b) => inks.slice(0, b).map((_, a) => [a, b] as const));
	const borders = {
		a: Uint32Array.from(pairs, ([a]) => a),
		b: Uint32Array.from(pairs, ([, b]) => b),
		kind: new Uint8Array(pairs.length),
		metres: new Float64Array(pairs.length),
		at: new Float64Array(2 * pairs.length),
	};
	const demands = pairDemands({
		...{ borders, colouring: inks.map((_, ink) => ink), inks: inks.map(({ hex }) => hex) },
		sizesMm: inks.map(() => 7),
	});
	const judged = pairsOnSheet(inks, demands, { region: '#000000', group: '#000000' });
	const seen = judged.flatMap(({ a, b, readers: all }) =>
		all
			.filter(({ reader }) => reader !== 'grey')
			.map(({ reader, found }) => ({ pair: `${a} ${b}`, reader, value: found })),
	);
	const closest = seen.reduce((one, two) => (two.value < one.value ? two : one));
	return { unsafe: judged.filter(isUnsafe).length, closest };
}

function culoriClosest(inks: readonly Ink[]) {
	const difference = differenceCiede2000();
	const eyes = readers.filter((reader) => reader !== 'grey');
	const labs = inks.map(({ hex }) =>
		eyes.map((reader) => {
			const [r, g, b] = seenLinear(linearOf(hex), reader);
			return lab65({ mode: 'lrgb', r, g, b } as unknown as Rgb);
		}),
	);
	const all = inks.flatMap((_, b) =>
		inks.slice(0, b).flatMap((_, a) =>
			eyes.map((reader, e) => ({
				pair: `${a} ${b}`,
				...{ reader, value: difference(labs[a][e], labs[b][e]) },
			})),
		),
	);
	return all.reduce((one, two) => (two.value < one.value ? two : one));
}

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

	// every ink touches every other in regions of 7 mm; which pair is closest was found by culori 4.0.2 on
	// the same simulated colours, apart from this product's own measure
	it.each([
		...['brewer-set1', 'brewer-set2', 'brewer-set3', 'brewer-dark2', 'brewer-paired'],
		...['brewer-pastel1', 'brewer-pastel2', 'brewer-accent', 'okabe-ito', 'tol-bright', 'tol-pale'],
	])('%s fails on a sheet where all its inks touch', (id) => {
		const { inks } = publishedPalette(id);
		const { unsafe, closest } = onSheet(inks);
		expect(unsafe).toBeGreaterThan(0);
		const measured = culoriClosest(inks);
		expect(closest.pair).toBe(measured.pair);
		expect(closest.reader).toBe(measured.reader);
		expect(closest.value).toBeCloseTo(measured.value, 3);
	});

	it.each(housePalettes)('$name of the house passes on such a sheet', ({ inks }) => {
		expect(onSheet(inks).unsafe).toBe(0);
	});

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
