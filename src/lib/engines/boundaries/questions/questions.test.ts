import proj4 from 'proj4';
import { strToU8 } from 'fflate';
import type { Feature, Polygon } from 'geojson';
import { describe, expect, it } from 'vitest';
import { writeShapefileZip } from '../../../../../tests/support/shapefile.ts';
import {
	accepted,
	box,
	collection,
	refusal,
} from '../../../../../tests/support/read-boundaries.ts';
import { epsgDefinition } from '../epsg.ts';
import { knownSystems } from '../epsg-systems.ts';
import { readBoundaries, sourceOf } from '../index.ts';
import { likenessOf } from '../likeness.ts';

const bytesOf = (features: Feature[]) => strToU8(JSON.stringify(collection(features)));
const shapefileOf = (features: Feature<Polygon>[]) => writeShapefileZip({ features });

describe('in which system metres are', () => {
	// EPSG guidance note 7-2: worked example of the British National Grid, 577274.99 E 69740.50 N
	const britain = [box('a', 570000, 60000, 577275, 69740), box('b', 577275, 60000, 584000, 69740)];

	it('is asked with likely systems, each with where the map would lie', async () => {
		const { code, question } = await refusal(shapefileOf(britain));
		expect(code).toBe('crs-missing');
		expect(question).toMatchObject({ about: 'crs', free: true });
		const grid = question?.choices.find(({ value }) => value === 'EPSG:27700');
		// the worked example is 50°30' N 0°30' E on the grid's own datum
		expect(grid?.words).toMatch(
			/British National Grid \(EPSG:27700\): .*between 0\.39° and 0\.59° east/,
		);
		expect(grid?.sketch?.lines).toHaveLength(2);
		expect(question?.choices.length).toBeLessThanOrEqual(8);
		const read = await accepted(shapefileOf(britain), grid?.options);
		const { arcPoints } = read.coverage;
		for (let i = 0; i < arcPoints.length; i += 2) {
			expect(arcPoints[i]).toBeGreaterThanOrEqual((grid?.sketch?.box[0] ?? 0) - 1e-6);
			expect(arcPoints[i + 1]).toBeLessThanOrEqual((grid?.sketch?.box[3] ?? 0) + 1e-6);
		}
	});

	it('puts first what the file is named by', async () => {
		const utm = shapefileOf([box('a', 400000, 5600000, 410000, 5610000)]);
		const read = await readBoundaries(sourceOf('wards_32633.zip', utm));
		if (read.status !== 'refused') throw new Error(read.status);
		expect(read.question?.choices[0].value).toBe('EPSG:32633');
		expect(read.question?.choices[0].words).toContain('UTM zone 33 north');
	});

	it('offers northing first where no local system fits otherwise', async () => {
		// Stockholm is near 6 580 000 N, 674 000 E of SWEREF 99 TM, from memory
		const swapped = shapefileOf([box('a', 6_570_000, 670_000, 6_590_000, 680_000)]);
		const { question } = await refusal(swapped);
		const choice = question?.choices.find(({ value }) => value === 'EPSG:3006');
		expect(choice?.words).toContain('northing first');
		expect(choice?.options).toEqual({ crs: 'EPSG:3006', axes: 'latlon' });
		const { arcPoints } = (await accepted(swapped, choice?.options)).coverage;
		expect(arcPoints[0]).toBeCloseTo(18, 0);
		expect(arcPoints[1]).toBeCloseTo(59.3, 0);
	});

	it('is asked of an unknown system too, and of nobody where the metres fit nowhere', async () => {
		const unknown = await refusal(bytesOf(britain), { crs: 'EPSG:999999' });
		expect([unknown.code, unknown.question?.about]).toEqual(['crs-missing', 'crs']);
		const nowhere = await refusal(bytesOf([box('a', 1e12, 1e12, 1.1e12, 1.1e12)]));
		expect(nowhere.question?.choices).toEqual([]);
	});

	it('each listed system is known to the library and lays its area onto itself', () => {
		for (const [code, name, [west, south, east, north]] of knownSystems) {
			const to = proj4('EPSG:4326', epsgDefinition(code) ?? '');
			const middle: [number, number] = [
				(west + east) / 2,
				Math.max(-85, Math.min(85, (south + north) / 2)),
			];
			const there = to.forward([...middle]);
			const back = to.inverse([...there]);
			expect(back[0], name).toBeCloseTo(middle[0], 4);
			expect(back[1], name).toBeCloseTo(middle[1], 4);
		}
	});
});

describe('which number comes first', () => {
	it('is asked where latitudes are out of range, with where the other order lies', async () => {
		const swapped = bytesOf([box('a', 47, 105, 48, 106), box('b', 47, 106, 48, 107)]);
		const { code, question } = await refusal(swapped);
		expect(code).toBe('axes-swapped');
		expect(question?.choices.map(({ value }) => value)).toEqual(['latlon']);
		const [choice] = question?.choices ?? [];
		expect(choice.words).toBe(
			'Latitude first: the map would lie between 105° and 107° east and between 47° and 48° north.',
		);
		expect(choice.sketch?.box).toEqual([105, 47, 107, 48]);
		expect(question?.found.sketch?.box).toEqual([47, 105, 48, 107]);
		expect((await accepted(swapped, choice.options)).coverage.keys).toEqual(['a', 'b']);
	});
});

describe('what doubled keys mean', () => {
	const features = [0, 1, 2].map((i) => ({
		...box('', i, 0, i + 1, 1),
		id: undefined,
		properties: { code: ['x', 'y', 'x'][i], number: i + 1, half: i ? i : null },
	}));

	it('is asked with what joining and telling apart would give, and columns that are unique', async () => {
		const { code, question } = await refusal(bytesOf(features), { keyField: 'code' });
		expect(code).toBe('duplicate-keys');
		expect(question).toMatchObject({ about: 'keys', free: true });
		expect(question?.choices.map(({ value, words }) => [value, words])).toEqual([
			['merge', expect.stringContaining('at most 2 regions from 3 features')],
			['rename', expect.stringContaining('number in brackets')],
			['number', 'Take the keys from "number": all 3 values differ, such as 1, 2, 3.'],
		]);
		const keys = await Promise.all(
			(question?.choices ?? []).map(
				async ({ options }) => (await accepted(bytesOf(features), options)).coverage.keys,
			),
		);
		expect(keys).toEqual([
			['x', 'y'],
			['x', 'y', 'x (2)'],
			['1', '2', '3'],
		]);
	});

	it('is asked of features whose own ids are doubled', async () => {
		const doubled = bytesOf([box('a', 0, 0, 1, 1), box('a', 1, 0, 2, 1)]);
		const { question } = await refusal(doubled);
		expect(question?.choices.map(({ value }) => value)).toEqual(['merge', 'rename']);
		expect((await accepted(doubled, question?.choices[0].options)).coverage.keys).toEqual(['a']);
	});

	it('is not asked of a column with gaps or one that is not there, only which to take instead', async () => {
		for (const keyField of ['half', 'nowhere']) {
			const { question } = await refusal(bytesOf(features), { keyField });
			expect(question?.message).toBe('Which column holds the keys of the regions?');
			expect(question?.choices.map(({ value }) => value)).toEqual(['number']);
		}
	});
});

describe('what was found', () => {
	it('tells format, layer, system, columns and a drawing', async () => {
		const features = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)].map((feature, i) => ({
			...feature,
			properties: { name: `n${i}`, gap: i || null },
		}));
		const { found } = await accepted(bytesOf(features));
		expect(found).toMatchObject({
			format: 'GeoJSON',
			crs: 'EPSG:4326',
			encoding: 'UTF-8',
			features: 2,
			keyField: 'id',
			nameField: 'name',
			columns: [
				{ name: 'name', examples: ['n0', 'n1'], distinct: 2, empty: 0 },
				{ name: 'gap', examples: ['1'], distinct: 1, empty: 1 },
			],
		});
		expect(found.sketch).toEqual({
			box: [0, 0, 2, 1],
			lines: features.map(({ geometry }) => geometry.coordinates[0].flat()),
			leftOut: 0,
		});
	});

	it('is alike for files of the same layers and columns, whatever they hold', () => {
		const one = likenessOf('GeoJSON', ['a'], ['code', 'name']);
		expect(one).toMatch(/^[0-9a-f]{14}$/);
		expect(likenessOf('GeoJSON', ['a'], ['code', 'name'])).toBe(one);
		const others = [
			likenessOf('CSV', ['a'], ['code', 'name']),
			likenessOf('GeoJSON', [], ['a', 'code', 'name']),
			likenessOf('GeoJSON', ['a'], ['name', 'code']),
			likenessOf('GeoJSON', ['a', 'code'], ['name']),
		];
		expect(new Set([one, ...others]).size).toBe(5);
	});
});
