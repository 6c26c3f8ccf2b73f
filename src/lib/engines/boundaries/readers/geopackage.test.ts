import { zipSync } from 'fflate';
import type { Geometry } from 'geojson';
import { describe, expect, it } from 'vitest';
import { writeGeoPackage } from '../../../../../tests/support/geopackage.ts';
import { accepted, box, refusal } from '../../../../../tests/support/read-boundaries.ts';

const two = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)].map((feature, i) => ({
	...feature,
	properties: { code: ['x', 'y'][i], people: 12 + i },
}));
const wards = { name: 'wards', features: two };
const stops = {
	name: 'stops',
	kind: 'POINT',
	features: [{ ...two[0], geometry: { type: 'Point', coordinates: [0, 0] } as Geometry }],
};

describe('what is read', () => {
	it('the only layer that may hold areas, keys from the first column that tells features apart', async () => {
		const read = await accepted(await writeGeoPackage([stops, wards]));
		expect(read.coverage.keys).toEqual(['x', 'y']);
		expect(read.attributes).toEqual({
			columns: ['code', 'people', 'fid'],
			rows: [
				['x', 12, 1],
				['y', 13, 2],
			],
		});
		expect(read.source).toMatchObject({ format: 'GeoPackage', layer: 'wards', crs: 'EPSG:4326' });
		expect(read.found.layers).toEqual([
			{ name: 'stops', features: 1, areas: false, crs: 'EPSG:4326' },
			{ name: 'wards', features: 2, areas: null, crs: 'EPSG:4326' },
		]);
		const byRow = await accepted(await writeGeoPackage([wards]), { keyField: 'id' });
		expect(byRow.coverage.keys).toEqual(['1', '2']);
	});

	it('names that are SQL, whole numbers too long for a double, and truth values', async () => {
		const evil = 'a"; DROP TABLE gpkg_contents; --';
		const bytes = await writeGeoPackage(
			[{ name: evil, features: two.map((f) => ({ ...f, properties: { 'o"dd': 'v' } })) }],
			`ALTER TABLE "a""; DROP TABLE gpkg_contents; --" ADD COLUMN long INTEGER;
			 ALTER TABLE "a""; DROP TABLE gpkg_contents; --" ADD COLUMN yes BOOLEAN;
			 UPDATE "a""; DROP TABLE gpkg_contents; --" SET long = 9007199254740992 + fid, yes = fid = 1;`,
		);
		const { attributes, source } = await accepted(bytes, { layer: evil });
		expect(source.layer).toBe(evil);
		expect(attributes).toEqual({
			columns: ['o"dd', 'long', 'yes', 'fid'],
			rows: [
				['v', '9007199254740993', true, 1],
				['v', '9007199254740994', false, 2],
			],
		});
	});

	it('a system by its code or its definition, and none where it is undefined', async () => {
		// EPSG guidance note 7-2, worked example of LAEA Europe: 5°E 50°N is 3962799.45, 2999718.85
		const corner = [3962799.45, 2999718.85];
		const square = box('a', corner[0], corner[1], corner[0] + 1000, corner[1] + 1000);
		const read = await accepted(
			await writeGeoPackage([{ name: 'l', features: [square], srs: 3035 }]),
		);
		expect(read.source.crs).toBe('EPSG:3035');
		const [west, south] = [0, 1].map((i) =>
			Math.min(...read.coverage.arcPoints.filter((_, k) => k % 2 === i)),
		);
		expect(south).toBeCloseTo(50, 6);
		expect(west).toBeLessThan(5.0001);
		const house = box('a', 500000, 5000000, 501000, 5001000);
		const own = await accepted(
			await writeGeoPackage([{ name: 'l', features: [house], srs: 900001 }]),
		);
		expect(own.source.crs).toBe('House grid');
		expect(Math.min(...own.coverage.arcPoints.filter((_, k) => k % 2 === 0))).toBeCloseTo(15, 6);
		const none = await refusal(await writeGeoPackage([{ name: 'l', features: [house], srs: -1 }]));
		expect(none.code).toBe('crs-missing');
		const assumed = await accepted(await writeGeoPackage([{ ...wards, srs: 0 }]));
		expect(assumed.findings.map(({ code }) => code)).toContain('crs-assumed');
	});

	it('rows without geometry are left out and told', async () => {
		const features = [...two, { ...two[0], geometry: null }];
		const { findings, coverage } = await accepted(await writeGeoPackage([{ name: 'l', features }]));
		expect(coverage.keys).toHaveLength(2);
		expect(findings.find(({ code }) => code === 'no-area')?.message).toContain('number 3');
	});
});

describe('what is asked', () => {
	it('which of several layers, each with what it holds and how it looks', async () => {
		const bytes = await writeGeoPackage([wards, { ...wards, name: 'regions' }, stops]);
		const { code, question } = await refusal(bytes);
		expect(code).toBe('layer-needed');
		expect(question?.choices.map(({ value, words }) => [value, words])).toEqual([
			['wards', '2 features; areas or not is not known, in EPSG:4326.'],
			['regions', '2 features; areas or not is not known, in EPSG:4326.'],
		]);
		expect(question?.choices[0].sketch?.box).toEqual([0, 0, 2, 1]);
		const chosen = await accepted(bytes, question?.choices[1].options);
		expect(chosen.source.layer).toBe('regions');
		const zipped = await refusal(zipSync({ 'x.gpkg': bytes }));
		expect(zipped.question?.choices.map(({ value }) => value)).toEqual(['wards', 'regions']);
	});
});

describe('what is refused', () => {
	it('a layer that the database computes', async () => {
		const endless = `DROP TABLE wards; CREATE VIEW wards AS WITH RECURSIVE n(fid) AS
			(SELECT 1 UNION ALL SELECT fid + 1 FROM n) SELECT fid, NULL AS geom FROM n`;
		const view = await refusal(await writeGeoPackage([wards], endless));
		expect([view.code, view.message]).toEqual([
			'unsupported-format',
			expect.stringContaining('"wards" is computed'),
		]);
		const contents = `DROP TABLE gpkg_contents; CREATE VIEW gpkg_contents AS WITH RECURSIVE n(i) AS
			(SELECT 1 UNION ALL SELECT i + 1 FROM n) SELECT 'x' AS table_name, 'features' AS data_type FROM n`;
		expect((await refusal(await writeGeoPackage([wards], contents))).code).toBe(
			'unsupported-format',
		);
	});

	it('generated columns are not read', async () => {
		const huge = 'ALTER TABLE wards ADD COLUMN big AS (zeroblob(900000000))';
		const { attributes } = await accepted(await writeGeoPackage([wards], huge));
		expect(attributes.columns).toEqual(['code', 'people', 'fid']);
	});

	it('a database that is no GeoPackage, names a layer it lacks, or has text for geometry', async () => {
		const plain = await refusal(await writeGeoPackage([], 'DROP TABLE gpkg_contents'));
		expect(plain.message).toContain('no GeoPackage');
		const lacking = await refusal(await writeGeoPackage([wards], 'DROP TABLE wards'));
		expect(lacking.message).toContain('"wards", which is not in it');
		const text = await refusal(await writeGeoPackage([wards], "UPDATE wards SET geom = 'POLYGON'"));
		expect(text.message).toContain('Feature 1 has text');
		expect((await refusal(await writeGeoPackage([]))).code).toBe('no-areas');
		expect((await refusal(await writeGeoPackage([stops]))).message).toContain('only 1 point');
	});

	it('geometry whose header or counts lie, naming the feature', async () => {
		const spoilt = async (spoil: (bytes: Uint8Array) => Uint8Array) =>
			refusal(await writeGeoPackage([{ ...wards, spoil }]));
		const at = (place: number, value: number) => (bytes: Uint8Array) => {
			bytes[place] = value;
			return bytes;
		};
		expect((await spoilt(at(0, 0x51))).message).toMatch(/Feature 1 .*"GP"/);
		expect((await spoilt(at(20, 0xff))).message).toMatch(/Feature 1 .*declares \d+ points/);
		expect((await spoilt((bytes) => bytes.subarray(0, 30))).code).toBe('file-damaged');
	});

	it('a database cut off anywhere, and one with a spoilt page', async () => {
		const bytes = await writeGeoPackage([wards]);
		for (const end of [20, 99, 100, 4096, bytes.length >> 1, bytes.length - 1]) {
			expect((await refusal(bytes.slice(0, end))).code, String(end)).toBe('file-truncated');
		}
		for (let page = 0; page < bytes.length; page += 4096) {
			const copy = bytes.slice();
			copy.fill(0xa5, page ? page : 100, page + 4096);
			const { code } = await refusal(copy);
			expect(code).toBe('file-damaged');
		}
	});
});
