import type { Feature } from 'geojson';
import { describe, expect, it } from 'vitest';
import { multi, square } from '../../../../tests/support/dirty-maps.ts';
import {
	accepted,
	acceptedFeatures,
	box,
	pairsOf,
	readText,
	region,
} from '../../../../tests/support/read-boundaries.ts';
import { coverageFaults, type BoundaryOptions } from './index.ts';

/**
 * Faults of files that are put right, or left out, while reading, one by one. Elsewhere: noise,
 * T-junctions and tolerance (matching.test.ts), the 180th meridian and the poles (world.test.ts), holes,
 * overlaps, doubles, crossings and crumbs with their mends (mends/mends.test.ts).
 */
async function read(features: Feature[], options?: BoundaryOptions) {
	const result = await acceptedFeatures(features, options);
	expect(coverageFaults(result.coverage)).toEqual([]);
	const told = Object.fromEntries(result.findings.map((finding) => [finding.code, finding]));
	return { ...result, told };
}

const clean = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)];

describe('winding', () => {
	it('outer rings clockwise and holes anticlockwise give the same map, with a note', async () => {
		const hole = square(0.4, 0.4, 0.6, 0.6);
		const right = [region('a', square(0, 0, 1, 1), hole.toReversed()), region('in', hole)];
		const wrong = [region('a', square(0, 0, 1, 1).toReversed(), hole), region('in', hole)];
		const [one, two] = [await read(right), await read(wrong)];
		expect(one.told['ring-turned']).toBeUndefined();
		expect(two.told['ring-turned']).toMatchObject({ severity: 'note', regions: ['a'] });
		expect(two.coverage).toEqual(one.coverage);
		expect([...two.coverage.enclaveOf]).toEqual([-1, 0]);
	});
});

describe('what has no area', () => {
	it('a part of three corners on a line goes, the region stays', async () => {
		const flat = multi('a', [square(0, 0, 1, 1)], [[[3, 3], [4, 4], [5, 5]]]); // prettier-ignore
		const { coverage, told } = await read([flat, clean[1]]);
		expect(coverage.partRings.length - 1).toBe(2);
		expect(told['spike-dropped'].regions).toEqual(['a']);
	});
	it('a part of two corners, or one corner three times, goes and is told', async () => {
		for (const ring of [
			[
				[3, 3],
				[4, 4],
				[3, 3],
			],
			[
				[3, 3],
				[3, 3],
				[3, 3],
			],
		]) {
			// prettier-ignore
			const { coverage, told } = await read([multi('a', [square(0, 0, 1, 1)], [ring]), clean[1]]);
			expect(coverage.partRings.length - 1).toBe(2);
			expect(told['ring-collapsed']).toMatchObject({ severity: 'warning', regions: ['a'] });
		}
	});
	it('a hole without area goes, and the land around stays whole', async () => {
		const pierced = region('a', square(0, 0, 1, 1), [[0.2, 0.2], [0.8, 0.8], [0.2, 0.2]]); // prettier-ignore
		const whole = (await read([clean[0]])).coverage;
		expect((await read([pierced])).coverage.areasKm2).toEqual(whole.areasKm2);
	});
	it('a feature without geometry, or with lines and points only, is left out by number', async () => {
		const nothing = { type: 'Feature', id: 'n', properties: {}, geometry: null };
		const line = {
			type: 'Feature',
			id: 'l',
			properties: {},
			geometry: { type: 'LineString', coordinates: [[0, 0], [1, 1]] }, // prettier-ignore
		};
		const result = await read([...clean, nothing, line] as Feature[]);
		expect(result.coverage.keys).toEqual(['a', 'b']);
		expect(result.told['no-area'].message).toContain('number 3 (n), 4 (l) in the file');
		expect(pairsOf(result)).toEqual(['a-b line']);
	});
});

describe('mixed geometry', () => {
	it('areas in a collection with points and lines count, the rest does not', async () => {
		const mixed = {
			type: 'Feature',
			id: 'a',
			properties: {},
			geometry: {
				type: 'GeometryCollection',
				geometries: [
					{ type: 'Point', coordinates: [9, 9] },
					{ type: 'Polygon', coordinates: [[...square(0, 0, 1, 1), [0, 0]]] },
					{ type: 'MultiPolygon', coordinates: [[[...square(0, 3, 1, 4), [0, 3]]]] },
				],
			},
		};
		const result = await read([mixed as Feature, clean[1]]);
		expect(pairsOf(result)).toEqual(['a-b line']);
		expect(Math.max(...result.coverage.arcPoints)).toBe(4);
	});
	it('heights and measures are passed over', async () => {
		const high = structuredClone(clean);
		high[0].geometry.coordinates[0].forEach((point, i) => point.push(100 * i));
		high[1].geometry.coordinates[0].forEach((point) => point.push(7, 8));
		expect((await read(high)).coverage).toEqual((await read(clean)).coverage);
	});
});

describe('keys that stand twice', () => {
	const double = [clean[0], { ...clean[1], id: 'a' }, box('c', 2, 0, 3, 1)];
	it('are refused unless it is said what to do', async () => {
		const text = JSON.stringify({ type: 'FeatureCollection', features: double });
		const refused = await readText(text);
		expect(refused).toMatchObject({ status: 'refused', code: 'duplicate-keys' });
		expect('question' in refused && refused.findings[0].regions).toEqual(['a']);
	});
	it('are joined as parts: the line between them is gone', async () => {
		const merged = await read(double, { duplicateKeys: 'merge' });
		expect(pairsOf(merged)).toEqual(['a-c line']);
		expect(merged.coverage.areasKm2[0]).toBeCloseTo(
			(await read(clean)).coverage.areasKm2.reduce((p, q) => p + q),
			6,
		);
	});
	it('are told apart by a number', async () => {
		const renamed = await read(double, { duplicateKeys: 'rename' });
		expect(pairsOf(renamed)).toEqual(['a (2)-c line', 'a-a (2) line']);
		expect(renamed.told['duplicate-keys'].severity).toBe('warning');
	});
	it('with the same outline twice are joined and told, and are one of it once mended', async () => {
		const same = [clean[0], clean[0], clean[1]];
		const merged = await read(same, { duplicateKeys: 'merge' });
		const { offers, at } = merged.told['parts-overlap'];
		expect(at?.[0]).toBeCloseTo(0.5, 1);
		const mends = (offers ?? []).map(({ mend }) => mend);
		const mended = await read(same, { duplicateKeys: 'merge', mends });
		const once = await read(clean);
		expect([...mended.coverage.areasKm2]).toEqual([...once.coverage.areasKm2]);
		expect(pairsOf(mended)).toEqual(pairsOf(once));
		expect(mended.told['parts-overlap']).toBeUndefined();
	});
});

describe('many faults of a kind', () => {
	it('are told one by one up to 200, and the rest in one', async () => {
		const pairs = Array.from({ length: 203 }, (_, i) => [
			box(`w${i}`, 0, i, 0.6, i + 0.5),
			box(`e${i}`, 0.5, i, 1 + i / 1000, i + 0.5),
		]).flat();
		const moved = pairs.map((feature) => ({
			...feature,
			geometry: {
				...feature.geometry,
				coordinates: feature.geometry.coordinates.map((ring) => ring.map(([x, y]) => [x, y / 10])),
			},
		}));
		const { findings } = await accepted(
			new TextEncoder().encode(JSON.stringify({ type: 'FeatureCollection', features: moved })),
		);
		const overlaps = findings.filter(({ code }) => code === 'overlap');
		expect(overlaps).toHaveLength(201);
		expect(overlaps.filter(({ offers }) => offers?.length === 2)).toHaveLength(200);
		expect(overlaps[200].message).toBe('There are 3 smaller ones like this.');
		expect(overlaps[200].regions).toHaveLength(6);
	});
});
