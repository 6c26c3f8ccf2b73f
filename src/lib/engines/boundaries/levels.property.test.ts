import fc from 'fast-check';
import { booleanPointInPolygon } from '@turf/turf';
import { describe, expect, it } from 'vitest';
import { bordersOf } from '../borders/index.ts';
import { borderKinds } from '../borders/border-list.ts';
import {
	fractalNeighbours,
	fractalText,
	type FractalLand,
} from '../../../../tests/support/fractal-land.ts';
import { accepted } from '../../../../tests/support/read-boundaries.ts';
import { coverageFaults, coverageToGeoJson, displayLevels, simplifyCoverage } from './index.ts';
import type { Coverage } from './coverage.ts';

const coverageOf = async (land: FractalLand): Promise<Coverage> =>
	(await accepted(new TextEncoder().encode([...fractalText(land)].join('')))).coverage;

/** Pairs that share a line. */
function linePairs(coverage: Coverage): string[] {
	const { a, b, kind } = bordersOf(coverage);
	const pairs = Array.from(a, (_, i) => `${a[i]}-${b[i]}`);
	return pairs.filter((_, i) => borderKinds[kind[i]] === 'line').sort();
}

/** The same as the rows of the made-up land have it, whatever its lines look like. */
function pairsOfRows(land: FractalLand): string[] {
	const pairs: string[] = [];
	fractalNeighbours(land, (a, b, isPoint) => isPoint || pairs.push(`${a}-${b}`));
	return pairs.sort();
}

/** Proper crossings of all pairs of segments, the slow way: orientation signs (a textbook's definition). */
function crossings({ arcPoints: p, arcStarts }: Coverage): number {
	const segments: number[] = [];
	for (let arc = 0; arc + 1 < arcStarts.length; arc++)
		for (let i = arcStarts[arc]; i + 1 < arcStarts[arc + 1]; i++) segments.push(2 * i);
	const side = (i: number, j: number, k: number) =>
		Math.sign((p[j] - p[i]) * (p[k + 1] - p[i + 1]) - (p[j + 1] - p[i + 1]) * (p[k] - p[i]));
	let count = 0;
	for (let m = 0; m < segments.length; m++) {
		for (let n = 0; n < m; n++) {
			const [i, j] = [segments[m], segments[n]];
			const across = side(i, i + 2, j) * side(i, i + 2, j + 2) < 0;
			if (across && side(j, j + 2, i) * side(j, j + 2, i + 2) < 0) count++;
		}
	}
	return count;
}

const land = fc.record({
	regions: fc.integer({ min: 2, max: 12 }),
	inner: fc.integer({ min: 8, max: 40 }),
	seed: fc.integer({ min: 1, max: 1e6 }),
	metres: fc.constantFrom(100, 400, 1_500, 6_000, 50_000),
});

describe('thinned land', () => {
	it('loses no region and no part, keeps who shares a line, and crosses no lines', async () => {
		await fc.assert(
			fc.asyncProperty(land, async ({ metres, ...made }) => {
				const coverage = await coverageOf(made);
				const simple = simplifyCoverage(coverage, metres);
				expect(coverageFaults(simple.coverage)).toEqual([]);
				expect(linePairs(simple.coverage)).toEqual(pairsOfRows(made));
				expect(simple.coverage.regionParts).toEqual(coverage.regionParts);
				expect(simple.crossings).toBe(0);
				expect(crossings(simple.coverage)).toBe(0);
			}),
			{ numRuns: 25, seed: 4 },
		);
	}, 60_000);

	it('keeps a place in the middle of every region in that region, by turf', async () => {
		const coverage = await coverageOf({ regions: 16, inner: 40, seed: 9 });
		const { features } = coverageToGeoJson(simplifyCoverage(coverage, 3_000).coverage);
		expect(features).toHaveLength(16);
		for (const { id, geometry } of features) {
			const [x, y] = [Number(id) % 4, Math.floor(Number(id) / 4)];
			const middle = [(x + 0.5) * 0.05 - 4, (y + 0.5) * 0.05 + 45];
			expect(booleanPointInPolygon(middle, geometry), String(id)).toBe(true);
		}
	});
});

describe('levels of display', () => {
	it('are none for a small file, and for a large one each coarser than the next', async () => {
		expect(displayLevels(await coverageOf({ regions: 9, inner: 10, seed: 2 }))).toEqual([]);
		const land = { regions: 49, inner: 2_000, seed: 3 };
		const coverage = await coverageOf(land);
		const levels = displayLevels(coverage);
		expect(levels.map(({ level }) => level)).toEqual(levels.map((_, i) => i + 1));
		expect(levels.length).toBeGreaterThan(1);
		let [points, tolerance] = [0, Infinity];
		for (const level of levels) {
			expect(coverageFaults(level.coverage)).toEqual([]);
			expect(linePairs(level.coverage)).toEqual(pairsOfRows(land));
			expect(level.crossings).toBe(0);
			expect(level.points).toBe(level.coverage.arcPoints.length / 2);
			expect(level.points).toBeGreaterThan(points);
			expect(level.toleranceMetres).toBeLessThan(tolerance);
			[points, tolerance] = [level.points, level.toleranceMetres];
			// framed as the full geometry is
			expect(boxOf(level.coverage)).toEqual(boxOf(coverage));
		}
		expect(points).toBeLessThan(coverage.arcPoints.length / 2);
	}, 60_000);
});

function boxOf({ arcPoints }: Coverage): number[] {
	const [lons, lats] = [0, 1].map((odd) => arcPoints.filter((_, i) => i % 2 === odd));
	const least = (list: Float64Array) => list.reduce((a, b) => Math.min(a, b), Infinity);
	const most = (list: Float64Array) => list.reduce((a, b) => Math.max(a, b), -Infinity);
	return [lons, lats].flatMap((list) => [least(list), most(list)]);
}
