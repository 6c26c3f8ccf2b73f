import { zipSync } from 'fflate';
import { hostileFormats } from './hostile-formats.ts';
import { box, region } from './read-boundaries.ts';
import { shapefileMembers } from './shapefile.ts';

const wgs84 =
	'GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["degree",0.0174532925199433]]';
const text = (value: string) => new TextEncoder().encode(value);
const feature = (coordinates: string) =>
	`{"type":"FeatureCollection","features":[{"type":"Feature","properties":{},"geometry":{"type":"Polygon","coordinates":${coordinates}}}]}`;
const members = () => shapefileMembers({ features: [box('a', 0, 0, 1, 1)], prj: wgs84 });

/** 100 MB of zeros, packed. */
const bomb = () => zipSync({ 'a.shp': new Uint8Array(100_000_000) });

function withDeclaredSize(zip: Uint8Array, size: number): Uint8Array {
	const view = new DataView(zip.buffer, zip.byteOffset, zip.byteLength);
	view.setUint32(view.getUint32(zip.length - 6, true) + 24, size, true);
	return zip;
}

function truncatedShp(): Uint8Array {
	const parts = members();
	parts['regions.shp'] = (parts['regions.shp'] as Uint8Array).slice(0, 150);
	return zipSync(parts);
}

function manyPoints(): Uint8Array {
	const parts = members();
	const shp = (parts['regions.shp'] as Uint8Array).slice();
	new DataView(shp.buffer).setInt32(148, 2_000_000_000, true);
	return zipSync({ ...parts, 'regions.shp': shp });
}

function manyRows(): Uint8Array {
	const parts = members();
	const dbf = (parts['regions.dbf'] as Uint8Array).slice();
	new DataView(dbf.buffer).setUint32(4, 4_000_000_000, true);
	return zipSync({ ...parts, 'regions.dbf': dbf });
}

function sieve(): Uint8Array {
	const holes = Array.from({ length: 60_000 }, (_, i) => {
		const [x, y] = [(i % 300) / 301, Math.floor(i / 300) / 201];
		return [
			[x + 0.001, y + 0.001],
			[x + 0.001, y + 0.002],
			[x + 0.002, y + 0.001],
		];
	});
	const edge = Array.from({ length: 60_000 }, (_, i) => [i / 60_000, -1]);
	const features = [region('sieve', [...edge, [1, 1], [0, 1]], ...holes)];
	return zipSync(shapefileMembers({ features, prj: wgs84 }));
}

/** Files made to break a reader: how each is made, and the code it must be refused with. */
export const hostileFiles: Record<
	string,
	[make: () => Uint8Array | Promise<Uint8Array>, code: string]
> = {
	'a zip that unpacks to far more than a boundary file': [
		() => withDeclaredSize(bomb(), 4_000_000_000),
		'too-large-unpacked',
	],
	'a zip that unpacks to a thousand times its size': [bomb, 'too-large-unpacked'],
	'a zip that declares less than it unpacks to': [
		() => withDeclaredSize(bomb(), 1000),
		'too-large-unpacked',
	],
	'200,000 levels of nesting': [() => text('['.repeat(200_000)), 'not-geojson'],
	'200,000 levels of nesting in a property': [
		() => text(`{"type":"Feature","properties":{"a":${'['.repeat(200_000)}`),
		'not-geojson',
	],
	'200,000 levels of nesting in a topology': [
		() => text(`{"type":"Topology","objects":${'{"a":'.repeat(200_000)}`),
		'not-geojson',
	],
	'a text without end': [
		() => text(`{"type":"FeatureCollection","name":"${'x'.repeat(20_000_000)}`),
		'file-truncated',
	],
	'a file cut off': [
		() => text(feature('[[[0,0],[1,0],[1,1],[0,0]]]').slice(0, -9)),
		'file-truncated',
	],
	'a shapefile cut off': [truncatedShp, 'file-truncated'],
	'a coordinate that is no number': [
		() => text(feature('[[[0,0],[1,NaN],[1,1],[0,0]]]')),
		'bad-coordinate',
	],
	'two thousand million points in a record': [manyPoints, 'bad-coordinate'],
	'four thousand million rows in a table': [manyRows, 'file-truncated'],
	'60,000 holes in one ring': [sieve, 'too-large-unpacked'],
	'another kind of file': [
		() => Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10),
		'unsupported-format',
	],
	...hostileFormats,
};
