import { strToU8, zipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { writeGeoPackage } from '../../../../../tests/support/geopackage.ts';
import {
	accepted,
	box,
	collection,
	refusal,
} from '../../../../../tests/support/read-boundaries.ts';
import { shapefileMembers } from '../../../../../tests/support/shapefile.ts';

const two = [box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)].map((feature) => ({
	...feature,
	properties: { code: feature.id },
}));
const json = strToU8(JSON.stringify(collection(two)));
const wgs84 =
	'GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]]';
const layer = (name: string) => shapefileMembers({ features: two, prj: wgs84, name });

describe('an archive', () => {
	it('with several shapefiles asks which, telling what each holds', async () => {
		const points = new Uint8Array(100);
		const view = new DataView(points.buffer);
		view.setInt32(0, 9994);
		view.setInt32(24, 50);
		view.setInt32(32, 1, true);
		const zip = zipSync({ ...layer('wards'), ...layer('deep/parishes'), 'stops.shp': points });
		const { code, question } = await refusal(zip);
		expect(code).toBe('layer-needed');
		expect(question).toMatchObject({ about: 'layer', free: false });
		expect(question?.choices.map(({ value, words }) => `${value}: ${words}`)).toEqual([
			'wards: 2 features with areas, in WGS 84.',
			'parishes: 2 features with areas, in WGS 84.',
		]);
		expect(question?.found.layers.map(({ name, areas }) => [name, areas])).toEqual([
			['wards', true],
			['parishes', true],
			['stops', false],
		]);
		const read = await accepted(zip, { layer: 'parishes' });
		expect(read.found.layers).toHaveLength(3);
		expect(read.source).toMatchObject({ format: 'Shapefile', layer: 'parishes' });
	});

	it('tells layers of the same name apart by their folders', async () => {
		const zip = zipSync({ ...layer('2023/wards'), ...layer('2024/wards') });
		const { question } = await refusal(zip);
		expect(question?.choices.map(({ value }) => value)).toEqual(['2023/wards', '2024/wards']);
		expect((await accepted(zip, { layer: '2024/wards' })).coverage.keys).toEqual(['a', 'b']);
	});

	it('with several other files takes each as a layer, and its own layers inside it', async () => {
		const inner = ['wards', 'regions'].map((name) => ({ name, features: two }));
		const zip = zipSync({
			'plain.geojson': json,
			'both.gpkg': await writeGeoPackage(inner),
			'readme.txt': strToU8('hello'),
		});
		const outer = await refusal(zip);
		expect(outer.question?.choices.map(({ value }) => value)).toEqual(['plain', 'both']);
		expect((await accepted(zip, { layer: 'plain' })).source.layer).toBe('plain');
		const asked = await refusal(zip, { layer: 'both' });
		expect(asked.question?.choices.map(({ value }) => value)).toEqual([
			'both/wards',
			'both/regions',
		]);
		const [, regions] = asked.question?.choices ?? [];
		expect((await accepted(zip, regions.options)).coverage.keys).toEqual(['a', 'b']);
	});

	it('of one file is that file', async () => {
		const { source } = await accepted(zipSync({ 'data.json': json, 'readme.txt': strToU8('x') }));
		expect(source.format).toBe('GeoJSON');
	});

	it('inside an archive is refused, whatever it is called', async () => {
		const inner = zipSync({ 'a.geojson': json });
		for (const name of ['inner.zip', 'inner.kmz', 'inner.geojson']) {
			const { code, message } = await refusal(zipSync({ [name]: inner }));
			expect([code, message]).toEqual([
				'unsupported-format',
				expect.stringContaining('another archive'),
			]);
		}
	});

	it('with nothing to read says what it holds', async () => {
		const { message } = await refusal(zipSync({ 'readme.txt': strToU8('x') }));
		expect(message).toContain('readme.txt');
	});
});
