import { sourceOf } from '../byte-source.ts';
import type { BoundaryOptions, ByteSource, Limits, Watch } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { dbfRows, openDbf } from './dbf.ts';
import { readGeoJson } from './geojson.ts';
import { isPolygonShp } from './shp-check.ts';
import { readShp } from './shp.ts';
import { textEncoding } from './text-encoding.ts';
import { wholeFile } from './whole.ts';
import { ZipArchive } from './zip.ts';
import type { ZipEntry } from './zip-directory.ts';

type Options = BoundaryOptions & { limits: Limits };

/** A zip with one shapefile, or with several and the layer named; or with a single GeoJSON file. */
export async function readZip(
	source: ByteSource,
	options: Options,
	watch: Watch,
): Promise<RawLayer> {
	const archive = new ZipArchive(
		await wholeFile(source, options.limits.wholeBytes),
		options.limits,
	);
	const shapes = archive.entries.filter((entry) => /\.shp$/i.test(entry.name));
	if (shapes.length === 0) {
		const json = archive.entries.filter((entry) => /\.(geo)?json$/i.test(entry.name));
		if (json.length !== 1) throw noShapefile(archive);
		return readGeoJson(sourceOf(json[0].name, archive.unpack(json[0])), options.limits, watch);
	}
	const chosen = chooseLayer(archive, shapes, options.layer);
	watch.progress?.(`Unpacking ${chosen.name}`, 0.1);
	return readShapefile(archive, chosen, options.limits);
}

function chooseLayer(archive: ZipArchive, shapes: ZipEntry[], layer?: string): ZipEntry {
	const names = shapes.map(layerName);
	if (layer !== undefined) {
		const chosen = shapes.find((entry) => layerName(entry) === layer || entry.name === layer);
		if (chosen) return chosen;
		throw layerNeeded(`There is no layer "${layer}".`, names);
	}
	if (shapes.length === 1) return shapes[0];
	const areas = shapes.filter((entry) => isPolygonShp(archive.head(entry, 100)));
	if (areas.length === 1) return areas[0];
	throw layerNeeded(
		'The archive holds several layers.',
		(areas.length ? areas : shapes).map(layerName),
	);
}

async function readShapefile(
	archive: ZipArchive,
	shp: ZipEntry,
	limits: Limits,
): Promise<RawLayer> {
	const beside = (ending: string) => archive.find(shp.name.replace(/\.shp$/i, ending));
	const text = (ending: string) => {
		const entry = beside(ending);
		return entry ? new TextDecoder().decode(archive.unpack(entry)).trim() : null;
	};
	const bytes = archive.unpack(shp);
	const layer = new RawLayer(limits, Math.ceil(bytes.length / 16));
	layer.format = 'Shapefile';
	layer.layer = layerName(shp);
	layer.crs = text('.prj');
	await readShp(bytes, layer);
	const dbf = beside('.dbf');
	if (dbf) await readTable(archive.unpack(dbf), text('.cpg'), layer);
	else for (let i = 0; i < layer.regions; i++) layer.table.add(null, null);
	return layer;
}

async function readTable(bytes: Uint8Array, cpg: string | null, layer: RawLayer): Promise<void> {
	const table = openDbf(bytes);
	if (table.records !== layer.regions) {
		const message = `The .shp file has ${layer.regions} records but the .dbf file has ${table.records}.`;
		throw new Refusal('file-truncated', message);
	}
	const { encoding, findings } = textEncoding(cpg, table.languageByte, table.texts);
	layer.encoding = encoding === 'utf-8' ? 'UTF-8' : encoding;
	layer.findings.push(...findings);
	for await (const row of dbfRows(table, encoding)) layer.table.add(null, row);
}

const layerName = (entry: ZipEntry) => entry.name.replace(/^.*\//, '').replace(/\.shp$/i, '');

export function layerNeeded(said: string, names: string[]): Refusal {
	return new Refusal('layer-needed', `${said} Choose one of: ${names.join(', ')}.`);
}

function noShapefile(archive: ZipArchive): Refusal {
	const names = archive.entries.slice(0, 5).map((entry) => entry.name);
	const message = `The archive holds no shapefile (.shp) but: ${names.join(', ') || 'nothing'}.`;
	return new Refusal('unsupported-format', message);
}
