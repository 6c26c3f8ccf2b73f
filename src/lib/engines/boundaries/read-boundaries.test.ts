import { zipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { shapefileMembers, writeShapefileZip } from '../../../../tests/support/shapefile.ts';
import {
	accepted,
	box,
	collection,
	pairsOf,
	readText,
	refusal,
} from '../../../../tests/support/read-boundaries.ts';
import { coverageFaults, readBoundaries, sourceOf } from './index.ts';

const text = (value: string) => new TextEncoder().encode(value);
const two = collection([box('a', 0, 0, 1, 1), box('b', 1, 0, 2, 1)]);

describe('what is accepted', () => {
	it('reads features, bare geometries, a feature a line and text sequences alike', async () => {
		const [a, b] = two.features.map((feature) => JSON.stringify(feature));
		for (const form of [JSON.stringify(two), `${a}\n${b}\n`, `\x1e${a}\n\x1e${b}\n`]) {
			const read = await accepted(text(form));
			expect(pairsOf(read)).toEqual(['a-b line']);
			expect(coverageFaults(read.coverage)).toEqual([]);
		}
		const bare = await accepted(text(JSON.stringify(two.features[0].geometry)));
		expect(bare.coverage.keys).toEqual(['1']);
	});

	it('reads a file in pieces of any size to the same coverage', async () => {
		const bytes = text(JSON.stringify(two, null, 2));
		const whole = await accepted(bytes);
		for (const size of [1, 7, 100]) {
			const pieces = await readBoundaries(sourceOf('x', bytes, size));
			expect(pieces).toEqual(whole);
		}
	});

	it('takes coordinates before the type, escapes and foreign members', async () => {
		const read = await accepted(
			text(
				'{"features":[{"geometry":{"coordinates":[[[0,0,9],[1e0,0,9],[1,1.0,9],[0,0,9]]],"type":"Polygon"},' +
					'"properties":{"n\\u00e9":"caf\\u00e9 \\"x\\"","deep":{"a":[1]}},"x":[{}],"id":7,"type":"Feature"}],"type":"FeatureCollection"}',
			),
		);
		expect(read.coverage.keys).toEqual(['7']);
		expect(read.attributes).toEqual({ columns: ['né', 'deep'], rows: [['café "x"', '{"a":[1]}']] });
	});

	it('keeps whole numbers that are too long for a double apart', async () => {
		const features = ['9007199254740992', '9007199254740993'].map((id, i) =>
			JSON.stringify(box('', i, 0, i + 1, 1)).replace('"id":""', `"id":${id}`),
		);
		const read = await accepted(text(`{"type":"FeatureCollection","features":[${features}]}`));
		expect(read.coverage.keys).toEqual(['9007199254740992', '9007199254740993']);
	});

	it('honours the crs member of the 2008 format', async () => {
		const crs = { type: 'name', properties: { name: 'urn:ogc:def:crs:EPSG::3857' } };
		const read = await accepted(text(JSON.stringify({ ...two, crs })));
		expect(read.source.crs).toBe('EPSG:3857');
		// One metre on the equator in web Mercator is 360/40,075,016.69 degrees (EPSG guidance note 7-2).
		expect(Math.max(...read.coverage.arcPoints)).toBeCloseTo((2 * 360) / 40075016.6856, 12);
	});
});

describe('keys', () => {
	const named = collection([
		{ ...box('a', 0, 0, 1, 1), id: undefined, properties: { code: 'x', name: 'One' } },
		{ ...box('b', 1, 0, 2, 1), id: undefined, properties: { code: 'y', name: 'One' } },
	]);
	it('come from the first column that is present and unique', async () => {
		const read = await accepted(text(JSON.stringify(named)));
		expect(read.coverage.keys).toEqual(['x', 'y']);
		expect(read.coverage.names).toEqual(['One', 'One']);
	});
	it('that stand twice are refused, joined or renamed as asked', async () => {
		const options = { keyField: 'name' };
		const refused = await refusal(text(JSON.stringify(named)), options);
		expect(refused.code).toBe('duplicate-keys');
		expect(refused.findings[0].regions).toEqual(['One']);
		const merged = await accepted(text(JSON.stringify(named)), {
			...options,
			duplicateKeys: 'merge',
		});
		expect(merged.coverage.keys).toEqual(['One']);
		expect(merged.coverage.partRings.length - 1).toBe(1);
		const renamed = await accepted(text(JSON.stringify(named)), {
			...options,
			duplicateKeys: 'rename',
		});
		expect(renamed.coverage.keys).toEqual(['One', 'One (2)']);
	});
});

describe('what is refused, with the place named', () => {
	const feature = (coordinates: string) =>
		`{"type":"FeatureCollection","features":[{"type":"Feature","properties":{},"geometry":{"type":"Polygon","coordinates":${coordinates}}}]}`;
	const cases: [string, string, string, RegExp][] = [
		['an empty file', '', 'empty-file', /empty/],
		['white space', ' \n ', 'empty-file', /white space/],
		['a text', 'hello', 'unsupported-format', /neither/],
		['a list', '[1]', 'not-geojson', /byte 0/],
		['an object that is no map', '{"a":1}', 'not-geojson', /neither features/],
		['broken JSON', '{"type":"FeatureCollection","features":[}', 'not-geojson', /byte 40/],
		['NaN', feature('[[[0,0],[1,NaN],[1,1],[0,0]]]'), 'bad-coordinate', /"NaN".*feature 1/],
		['Infinity', feature('[[[0,0],[1e999,0],[1,1],[0,0]]]'), 'bad-coordinate', /1e999|feature 1/],
		[
			'a text for a number',
			feature('[[[0,0],["1",0],[1,1],[0,0]]]'),
			'bad-coordinate',
			/feature 1/,
		],
		['one number', feature('[[[0],[1,0],[1,1],[0,0]]]'), 'bad-coordinate', /at least two/],
		['points only', JSON.stringify({ type: 'Point', coordinates: [1, 2] }), 'no-areas', /area/],
		['no area', feature('[[[0,0],[1,0],[2,0],[0,0]]]'), 'no-areas', /area/],
		[
			'metres',
			feature('[[[500000,0],[500001,0],[500001,1],[500000,0]]]'),
			'crs-missing',
			/degrees/,
		],
		['swapped axes', feature('[[[50,120],[51,120],[51,121],[50,120]]]'), 'axes-swapped', /swapped/],
		['deep nesting', '['.repeat(200_000), 'not-geojson', /list/],
		[
			'deep nesting in a property',
			`{"type":"Feature","properties":{"a":${'['.repeat(200_000)}`,
			'not-geojson',
			/deeper than 64/,
		],
		['a byte order mark and nothing else', '\ufeff', 'empty-file', /white space/],
	];
	it.each(cases)('%s', async (_, content, code, said) => {
		const refused = await refusal(text(content));
		expect(refused.code).toBe(code);
		expect(refused.message).toMatch(said);
	});

	it('thousands of outlines that meet in one place, with the place', async () => {
		const at = (step: number) => [Math.cos(step / 1000), Math.sin(step / 1000)];
		const triangles = Array.from({ length: 3000 }, (_, i) => ({
			type: 'Feature',
			properties: {},
			geometry: {
				type: 'Polygon',
				coordinates: [[[0, 0], at(2 * i), at(2 * i + 1), [0, 0]]],
			},
		}));
		const fan = { type: 'FeatureCollection', features: triangles };
		const refused = await refusal(text(JSON.stringify(fan)));
		expect(refused.code).toBe('bad-coordinate');
		expect(refused.message).toMatch(/longitude 0\.00000, latitude 0\.00000/);
	});

	it('a file cut off anywhere, with the byte', async () => {
		const whole = JSON.stringify(two);
		for (let end = 1; end < whole.length; end += 13) {
			const refused = await refusal(text(whole.slice(0, end)));
			expect(refused.code).toBe('file-truncated');
			expect(refused.message).toContain(`byte ${end}`);
		}
	});

	it('stops when asked to', async () => {
		const read = await readBoundaries(
			sourceOf('x', text(JSON.stringify(two))),
			{},
			{
				cancelled: () => true,
			},
		);
		expect(read).toEqual({ status: 'cancelled' });
	});

	it('arcs that point nowhere', async () => {
		const topology = {
			type: 'Topology',
			arcs: [
				[
					[0, 0],
					[1, 0],
					[1, 1],
					[0, 0],
				],
			],
			objects: { r: { type: 'Polygon', id: 'q', arcs: [[3]] } },
		};
		const refused = await refusal(text(JSON.stringify(topology)));
		expect(refused.code).toBe('bad-arc');
		expect(refused.message).toContain('"q"');
	});
});

describe('zipped shapefiles', () => {
	const metres =
		'PROJCS["x",GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]],PROJECTION["Transverse_Mercator"],PARAMETER["latitude_of_origin",0],PARAMETER["central_meridian",9],PARAMETER["scale_factor",0.9996],PARAMETER["false_easting",500000],PARAMETER["false_northing",0],UNIT["metre",1]]';
	const utm = collection([
		box('ä', 500000, 5_500_000, 510000, 5_510_000),
		box('b', 510000, 5_500_000, 520000, 5_510_000),
	]).features.map((f) => ({ ...f, properties: { code: f.id } }));

	it('are brought to degrees by their .prj and read in their encoding', async () => {
		for (const encoding of ['utf-8', 'windows-1252', 'iso-8859-15', 'windows-1250']) {
			const read = await accepted(writeShapefileZip({ features: utm, prj: metres, encoding }));
			expect(read.coverage.keys).toEqual(['ä', 'b']);
			expect(pairsOf(read)).toEqual(['b-ä line']);
			// Scale on the central meridian of UTM is 0.9996 (EPSG guidance note 7-2, zone definition).
			expect(read.coverage.areasKm2[0]).toBeCloseTo(100 / 0.9996 ** 2, 1);
		}
	});
	it('say when the encoding was guessed', async () => {
		const zip = writeShapefileZip({
			features: utm,
			prj: metres,
			encoding: 'windows-1252',
			cpg: false,
		});
		const read = await accepted(zip);
		expect(read.coverage.keys[0]).toBe('ä');
		expect(read.findings.map((f) => f.code)).toContain('encoding-guessed');
		const told = writeShapefileZip({
			features: utm,
			prj: metres,
			encoding: 'windows-1250',
			cpg: false,
			languageByte: 0xc8,
		});
		expect((await accepted(told)).source.encoding).toBe('windows-1250');
	});
	it('in metres without a .prj are refused', async () => {
		expect((await refusal(writeShapefileZip({ features: utm }))).code).toBe('crs-missing');
		const read = await accepted(writeShapefileZip({ features: utm }), { crs: 'EPSG:32632' });
		expect(read.source.crs).toBe('EPSG:32632');
	});
	it('with several layers ask which', async () => {
		const members = {
			...shapefileMembers({ features: utm, name: 'one', prj: metres }),
			...shapefileMembers({ features: utm, name: 'two', prj: metres }),
		};
		const refused = await refusal(zipSync(members));
		expect(refused.code).toBe('layer-needed');
		expect(refused.message).toContain('one, two');
		expect((await accepted(zipSync(members), { layer: 'two' })).source.layer).toBe('two');
	});
	it('cut off anywhere are refused', async () => {
		const zip = writeShapefileZip({ features: utm, prj: metres });
		for (let end = 4; end < zip.length; end += 61) {
			expect((await refusal(zip.subarray(0, end))).code).toBe('zip-damaged');
		}
		const members = shapefileMembers({ features: utm, prj: metres });
		const shp = members['regions.shp'] as Uint8Array;
		for (const end of [99, 150, shp.length - 4]) {
			const cut = zipSync({ ...members, 'regions.shp': shp.slice(0, end) });
			expect((await refusal(cut)).code).toMatch(/file-truncated|zip-damaged/);
		}
	});
	it('that declare more points than they hold are refused', async () => {
		const members = shapefileMembers({ features: utm, prj: metres });
		const shp = (members['regions.shp'] as Uint8Array).slice();
		new DataView(shp.buffer).setInt32(100 + 8 + 40, 2_000_000_000, true);
		const refused = await refusal(zipSync({ ...members, 'regions.shp': shp }));
		expect(refused.code).toBe('bad-coordinate');
		expect(refused.message).toContain('Record 1');
	});
	it('that would unpack to too much, or lie about it, are refused', async () => {
		const bomb = zipSync({ 'a.shp': new Uint8Array(30_000_000) }, { level: 9 });
		const limits = { unpackedBytes: 10_000_000 };
		expect((await refusal(bomb, { limits })).code).toBe('too-large-unpacked');
		const lying = bomb.slice();
		const view = new DataView(lying.buffer);
		const directory = view.getUint32(lying.length - 22 + 16, true);
		view.setUint32(directory + 24, 1000, true);
		const refused = await refusal(lying, { limits });
		expect(refused.code).toBe('too-large-unpacked');
		expect(refused.message).toContain('1000 bytes');
	});
	it('with climbing paths or archives inside are refused', async () => {
		for (const name of ['../a.shp', '/a.shp', 'x/../../a.shp', 'c:\\a.shp']) {
			expect((await refusal(zipSync({ [name]: new Uint8Array(10) }))).code).toBe('zip-damaged');
		}
		const nested = zipSync({ 'inner.zip': zipSync({ 'a.shp': new Uint8Array(10) }) });
		expect((await refusal(nested)).code).toBe('unsupported-format');
	});
});

it('reads text files through the same door', async () => {
	expect((await readText(JSON.stringify(two))).status).toBe('accepted');
});
