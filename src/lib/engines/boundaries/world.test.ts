import { describe, expect, it } from 'vitest';
import {
	acceptedFeatures,
	box,
	metresOf,
	pairsOf,
	region,
} from '../../../../tests/support/read-boundaries.ts';
import { karneyMetres } from '../geometry/index.ts';
import { coverageFaults, decodeCoverage, encodeCoverage, type BoundaryOptions } from './index.ts';

async function read(features: Parameters<typeof acceptedFeatures>[0], options?: BoundaryOptions) {
	const result = await acceptedFeatures(features, options);
	expect(coverageFaults(result.coverage)).toEqual([]);
	expect(decodeCoverage(encodeCoverage(result.coverage))).toEqual(result.coverage);
	return result;
}

describe('the 180th meridian and the poles', () => {
	it('halves on both sides of it are one region, and neighbours across it meet', async () => {
		const west = box('w', 170, 0, 180, 10);
		const east = box('e', -180, 0, -170, 10);
		const both = await read([west, east]);
		expect(pairsOf(both)).toEqual(['e-w line']);
		expect(metresOf(both)['e-w']).toBeCloseTo(karneyMetres(180, 0, 180, 10), -1);
	});
	it('an outline that steps over it', async () => {
		const over = region('o', [
			[170, 0],
			[-170, 0],
			[-170, 10],
			[170, 10],
		]);
		const { coverage } = await read([over]);
		expect(coverage.areasKm2[0] / 2_451_000).toBeCloseTo(1, 1);
	});
	it('corners that meet on the seam of a whole world, or at a pole, touch in a point', async () => {
		const lunes = [-180, -60, 60].map((x) => box(`l${x}`, x, 60, x + 120, 90));
		const bands = [-180, -60, 60].map((x) => box(`b${x}`, x, -80, x + 120, -70));
		const tips = [
			region('w', [
				[-180, 20],
				[-170, 10],
				[-170, 30],
			]),
			region('e', [
				[180, 20],
				[170, 30],
				[170, 10],
			]),
			region('far', [
				[180, 21],
				[170, 35],
				[170, 32],
			]),
		];
		const pairs = pairsOf(await read([...lunes, ...bands, ...tips]));
		expect(pairs.filter((pair) => pair.endsWith('point'))).toEqual(['e-w point']);
		expect(pairs).toContain('l-180-l60 line');
		const four = [-180, -90, 0, 90].map((x) => box(`${x}`, x, 60, x + 90, 90));
		const polar = pairsOf(await read([...four, ...bands]));
		expect(polar.filter((pair) => pair.endsWith('point'))).toEqual([
			'-180-0 point',
			'-90-90 point',
		]);
	});
	it('a world of bands and caps keeps its neighbours at the seam', async () => {
		const lunes = [-180, -90, 0, 90].map((x) => box(`${x}`, x, -60, x + 90, 60));
		const cap = region('cap', [
			[-180, 60],
			[-90, 60],
			[0, 60],
			[90, 60],
			[180, 60],
			[180, 90],
			[-180, 90],
		]);
		const world = await read([...lunes, cap]);
		expect(pairsOf(world).filter((pair) => pair.endsWith('line'))).toEqual([
			'-180--90 line',
			'-180-90 line',
			'-180-cap line',
			'-90-0 line',
			'-90-cap line',
			'0-90 line',
			'0-cap line',
			'90-cap line',
		]);
	});
});

describe('across water', () => {
	const islands = [box('a', 0, 0, 1, 1), box('b', 1.05, 0, 2, 1), box('c', 2.05, 0, 3, 1)];
	it('within the width asked for, and not through a third region', async () => {
		// 0.05 degrees at latitude 1 are about 5.6 km; a and c are 117 km apart with b between.
		expect(pairsOf(await read(islands, { acrossWaterKm: 5 }))).toEqual([]);
		const wide = await read(islands, { acrossWaterKm: 6 });
		expect(pairsOf(wide)).toEqual(['a-b water', 'b-c water']);
		expect(metresOf(wide)['a-b']).toBeCloseTo(karneyMetres(1, 1, 1.05, 1), -1);
		expect(pairsOf(await read(islands, { acrossWaterKm: 200 }))).toHaveLength(2);
	});
});
