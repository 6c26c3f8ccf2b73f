import type { BoundaryOptions, ByteSource, Limits, Watch } from '../options.ts';
import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { readCsv } from './csv.ts';
import { IsTopology, readGeoJson } from './geojson.ts';
import { readGeoPackage } from './geopackage.ts';
import { readKml } from './kml.ts';
import { sqliteMagic } from './sqlite.ts';
import { noteStrays } from './strays.ts';
import { readTopoJson } from './topojson.ts';
import { firstBytes } from './whole.ts';
import { readZip } from './zip-contents.ts';

type Options = BoundaryOptions & { limits: Limits };

/**
 * Reads a file by what it begins with, whatever its name says: an archive, a GeoPackage, KML, a table with
 * well-known text, or GeoJSON and TopoJSON. Refuses with `no-areas` a file that holds none.
 */
export async function readLayer(
	source: ByteSource,
	options: Options,
	watch: Watch,
): Promise<RawLayer> {
	const first = await firstBytes(source);
	const isZip = startsWith(first, [0x50, 0x4b, 3, 4]) || startsWith(first, [0x50, 0x4b, 5, 6]);
	const readFile = (file: ByteSource, inner: Options) => readOpenFile(file, inner, watch);
	const layer = isZip ? await readZip(source, options, readFile) : await readFile(source, options);
	noteStrays(layer);
	return layer;
}

async function readOpenFile(source: ByteSource, options: Options, watch: Watch): Promise<RawLayer> {
	const first = await firstBytes(source);
	if (startsWith(first, [0x50, 0x4b, 3, 4])) {
		throw new Refusal(
			'unsupported-format',
			`"${source.name}" is another archive; unpack it first.`,
		);
	}
	if (startsWith(first, [0, 0, 0x27, 0x0a])) {
		const message = 'This is a lone .shp file; zip it together with its .dbf, .shx and .prj files.';
		throw new Refusal('unsupported-format', message);
	}
	if (startsWith(first, sqliteMagic)) return readGeoPackage(source, options, watch);
	const start = firstLetter(first);
	if (start === '<') {
		if (isWebPage(first)) throw new Refusal('unsupported-format', 'This is a web page, not a map.');
		return readKml(source, options, watch);
	}
	if (start === '{' || start === '[' || start === '') return readJson(source, options, watch);
	const table = isText(first) ? await readCsv(source, options, watch) : null;
	if (table) return table;
	const message =
		'The file is neither GeoJSON, TopoJSON, a zipped shapefile, a GeoPackage, KML nor a table with well-known text.';
	throw new Refusal('unsupported-format', message);
}

async function readJson(source: ByteSource, options: Options, watch: Watch): Promise<RawLayer> {
	try {
		return await readGeoJson(source, options.limits, watch);
	} catch (error) {
		if (error instanceof IsTopology) return readTopoJson(source, options);
		throw error;
	}
}

/** The first letter after marks, record separators and white space; empty where there is none. */
function firstLetter(bytes: Uint8Array): string {
	const skipped = new Set([0xef, 0xbb, 0xbf, 0xff, 0xfe, 0, 30, 32, 9, 10, 13]);
	const found = bytes.subarray(0, 64 * 1024).find((byte) => !skipped.has(byte));
	return found === undefined ? '' : String.fromCharCode(found);
}

/** What a download link gives when its page is saved instead of its file. */
function isWebPage(first: Uint8Array): boolean {
	const start = new TextDecoder('latin1').decode(first.subarray(0, 1024));
	return /<(!doctype\s+html|html)[\s>]/i.test(start);
}

/** Whether the first bytes may be a text: none of them is zero, or they are marked as UTF-16. */
function isText(first: Uint8Array): boolean {
	const isWide = startsWith(first, [0xff, 0xfe]) || startsWith(first, [0xfe, 0xff]);
	return isWide || first.subarray(0, 4096).every((byte) => byte >= 9);
}

const startsWith = (bytes: Uint8Array, magic: number[]) => magic.every((b, i) => bytes[i] === b);
