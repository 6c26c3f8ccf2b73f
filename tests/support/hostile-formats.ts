import { zipSync } from 'fflate';
import { writeGeoPackage } from './geopackage.ts';
import { placemark } from './kml.ts';
import { box } from './read-boundaries.ts';

const text = (value: string) => new TextEncoder().encode(value);
const square = box('a', 0, 0, 1, 1);
const land = { name: 'land', features: [square, box('b', 1, 0, 2, 1)] };
const wkt = 'POLYGON((0 0,1 0,1 1,0 0))';
const kml = (inner: string, before = '') =>
	text(`<?xml version="1.0"?>${before}<kml>${inner}</kml>`);

/** Ten entities, each ten times the one before: a thousand million letters if they were written out. */
function entityBomb(): Uint8Array {
	const entities = Array.from({ length: 9 }, (_, i) => {
		const before = i ? `&e${i - 1};`.repeat(10) : 'merestone';
		return `<!ENTITY e${i} "${before}">`;
	});
	return kml('<Placemark><name>&e8;</name></Placemark>', `<!DOCTYPE kml [${entities.join('')}]>`);
}

/** Tables of a database whose page of rows points to itself as its own child. */
async function loopingDatabase(): Promise<Uint8Array> {
	const features = Array.from({ length: 400 }, (_, i) => box(String(i), i, 0, i + 1, 1));
	const bytes = await writeGeoPackage([{ name: 'land', features }]);
	const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
	const pageBytes = view.getUint16(16);
	for (let page = 1; page * pageBytes < bytes.length; page++) {
		const at = page * pageBytes;
		// SQLite file format, 1.6: an inner page of a table begins with 5; the last child is at 8
		if (bytes[at] !== 5) continue;
		const cells = view.getUint16(at + 3);
		for (let cell = 0; cell < cells; cell++) {
			view.setUint32(at + view.getUint16(at + 12 + 2 * cell), page + 1);
		}
		view.setUint32(at + 8, page + 1);
	}
	return bytes;
}

async function spoiltGeometry(at: number, ...values: number[]): Promise<Uint8Array> {
	return writeGeoPackage([
		{
			...land,
			spoil(bytes) {
				bytes.set(values, at);
				return bytes;
			},
		},
	]);
}

async function cutDatabase(): Promise<Uint8Array> {
	const bytes = await writeGeoPackage([land]);
	return bytes.slice(0, bytes.length - 5000);
}

async function spoiltPage(): Promise<Uint8Array> {
	const bytes = await writeGeoPackage([land]);
	bytes.fill(0xa5, bytes.length - 4096);
	return bytes;
}

const endless = (name: string, columns: string) =>
	`DROP TABLE ${name}; CREATE VIEW ${name} AS WITH RECURSIVE n(i) AS
	 (SELECT 1 UNION ALL SELECT i + 1 FROM n) SELECT ${columns} FROM n`;

function loopingTopology(): Uint8Array {
	const ring = Array.from({ length: 10_000 }, (_, i) => [i % 100, Math.floor(i / 100)]);
	const geometry = { type: 'Polygon', arcs: [new Array(500_000).fill(0)] };
	const objects = { land: { type: 'GeometryCollection', geometries: [geometry] } };
	return text(JSON.stringify({ type: 'Topology', arcs: [[...ring, ring[0]]], objects }));
}

type Hostile = [make: () => Uint8Array | Promise<Uint8Array>, code: string];

/** Files of databases, XML, tables and archives made to break a reader, and the code of their refusal. */
export const hostileFormats: Record<string, Hostile> = {
	'a KML whose entities expand a thousand million times': [entityBomb, 'unsupported-format'],
	'a KML that names a file outside': [
		() => kml('&x;', '<!DOCTYPE kml [<!ENTITY x SYSTEM "file:///etc/passwd">]>'),
		'unsupported-format',
	],
	'200,000 levels of nesting in KML': [() => kml('<Folder>'.repeat(200_000)), 'file-damaged'],
	'a KML cut off': [
		() => text(`<kml><Document>${placemark(square).slice(0, -30)}`),
		'file-truncated',
	],
	'a KML text without end': [
		() => text(`<kml><Placemark><name>${'x'.repeat(20_000_000)}`),
		'file-truncated',
	],
	'a KML tag with a million attributes': [
		() => text(`<kml ${Array.from({ length: 1_000_000 }, (_, i) => `a${i}="1"`).join(' ')}`),
		'file-damaged',
	],
	'a KMZ that unpacks to a thousand times its size': [
		() => zipSync({ 'doc.kml': new Uint8Array(100_000_000) }),
		'too-large-unpacked',
	],
	'a KMZ within a zip': [
		() => zipSync({ 'inner.kmz': zipSync({ 'doc.kml': kml('') }) }),
		'unsupported-format',
	],
	'a zip within a zip under another name': [
		() => zipSync({ 'inner.geojson': zipSync({ 'a.geojson': text('{}') }) }),
		'unsupported-format',
	],
	'a path that climbs out': [() => zipSync({ '../../land.kml': kml('') }), 'zip-damaged'],
	'200,000 levels of nesting in well-known text': [
		() => text(`a,g\n1,${'GEOMETRYCOLLECTION('.repeat(200_000)}\n`),
		'file-damaged',
	],
	'200,000 brackets in well-known text': [
		() => text(`a;g\n1;POLYGON${'('.repeat(200_000)}\n`),
		'bad-coordinate',
	],
	'a table cut off': [() => text(`a,g\n1,"${wkt}"\n2,"${wkt.slice(0, -4)}`), 'file-truncated'],
	'a quotation mark that never closes': [
		() => text(`a,g\n1,"${wkt}"\n2,"${'x\n'.repeat(20_000_000)}`),
		'too-large-unpacked',
	],
	'quotation marks without end': [
		() => text(`a,g\n1,"${wkt}"\n2,${'"x'.repeat(10_000_000)}`),
		'file-damaged',
	],
	'a table of a coordinate that is no number': [
		() => text(`a,g\n1,"${wkt.replace('1 1', '1 Infinity')}"\n`),
		'bad-coordinate',
	],
	'a database cut off': [cutDatabase, 'file-truncated'],
	'a database with a spoilt page': [spoiltPage, 'file-damaged'],
	'a database whose pages go in circles': [loopingDatabase, 'file-damaged'],
	'a database that is only a beginning': [
		() => text(`SQLite format 3\0${'\x7f'.repeat(5000)}`),
		'file-damaged',
	],
	'a database whose layer is computed without end': [
		() => writeGeoPackage([land], endless('land', 'i AS fid, NULL AS geom')),
		'unsupported-format',
	],
	'a database whose contents are computed without end': [
		() => writeGeoPackage([land], endless('gpkg_contents', "'x' AS table_name")),
		'unsupported-format',
	],
	'a database whose systems are computed without end': [
		() => writeGeoPackage([land], endless('gpkg_spatial_ref_sys', '0 AS srs_id')),
		'unsupported-format',
	],
	'four thousand million rings in a geometry': [
		() => spoiltGeometry(13, 255, 255, 255, 255),
		'file-damaged',
	],
	'four thousand million points in a ring': [
		() => spoiltGeometry(17, 255, 255, 255, 255),
		'file-damaged',
	],
	'a geometry whose coordinate is no number': [
		() => spoiltGeometry(21, 0, 0, 0, 0, 0, 0, 0xf8, 0x7f),
		'bad-coordinate',
	],
	'a geometry of another kind of file': [() => spoiltGeometry(0, 0x50, 0x47), 'file-damaged'],
	'arcs that would be written out five thousand million times': [
		loopingTopology,
		'too-large-unpacked',
	],
	'a sequence cut off by the next record': [
		() => text(`\x1e${JSON.stringify(square).slice(0, -1)}\x1e${JSON.stringify(square)}`),
		'not-json',
	],
	'a coordinate too large for a number': [
		() => text(JSON.stringify(square).replace('[1,0]', '[1e999,0]')),
		'bad-coordinate',
	],
};
