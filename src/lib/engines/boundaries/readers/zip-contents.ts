import { sourceOf } from '../byte-source.ts';
import { foundLayers } from '../found.ts';
import type { BoundaryOptions, ByteSource, Limits } from '../options.ts';
import type { FoundLayer } from '../question.ts';
import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { chooseLayer } from './choose-layer.ts';
import { wholeFile } from './whole.ts';
import { ZipArchive } from './zip.ts';
import type { ZipEntry } from './zip-directory.ts';
import { readShapefile, shapefileLayer } from './zipped-shapefile.ts';

type Options = BoundaryOptions & { limits: Limits };
/** Reads a file that is no archive. */
type ReadFile = (source: ByteSource, options: Options) => Promise<RawLayer>;

/** Endings of boundary files other than shapefiles; what they hold is told by their bytes. */
const mapEnding =
	/\.(geojson|json|topojson|geojsons|geojsonl|geojsonseq|ndjson|gpkg|kml|csv|tsv)$/i;

interface ZipLayer extends FoundLayer {
	entry: ZipEntry;
}

/**
 * A zip with shapefiles or any other boundary files, or a KMZ. A single file that is no shapefile is read
 * as if it lay open, its own layers included; several files are layers, named by their file.
 */
export async function readZip(
	source: ByteSource,
	options: Options,
	readFile: ReadFile,
): Promise<RawLayer> {
	const bytes = await wholeFile(source, options.limits.wholeBytes);
	const archive = new ZipArchive(bytes, options.limits);
	const entries = mapEntries(archive);
	if (entries.length === 0) throw noMap(archive);
	if (entries.length === 1 && !isShp(entries[0]))
		return readInside(archive, entries[0], options, readFile);
	const layers = entries.map((entry): ZipLayer => {
		const name = layerName(entry, entries);
		if (isShp(entry)) return { ...shapefileLayer(archive, entry, name), entry };
		return { name, features: null, areas: null, crs: null, entry };
	});
	const format = entries.every(isShp) ? 'Shapefile' : 'Archive';
	const asked = layers.find(({ name, entry }) => isAsked(options.layer, name, entry))?.name;
	const chosen = chooseLayer(format, layers, asked ?? options.layer);
	const layer = isShp(chosen.entry)
		? await readShapefile(archive, chosen.entry, options.limits)
		: await readMember(archive, chosen, options, readFile);
	if (isShp(chosen.entry)) layer.format = 'Shapefile';
	layer.layer = chosen.name;
	layer.layers = layers.map(({ entry: _, ...found }) => found);
	return layer;
}

/** By its own name, its file's name, or with the name of a layer inside it after a slash. */
const isAsked = (asked: string | undefined, name: string, entry: ZipEntry): boolean =>
	asked === name || asked === entry.name || (asked?.startsWith(`${name}/`) ?? false);

function mapEntries(archive: ZipArchive): ZipEntry[] {
	// OGC 07-147r2, annex C: a KMZ is read from its doc.kml, the other files belong to that
	const doc = archive.entries.find((entry) => /^doc\.kml$/i.test(entry.name));
	if (doc && !archive.entries.some(isShp)) return [doc];
	return archive.entries.filter((entry) => isShp(entry) || mapEnding.test(entry.name));
}

/** One of several files; a layer inside it is asked for, and asked about, as `file/layer`. */
async function readMember(
	archive: ZipArchive,
	{ name, entry }: ZipLayer,
	options: Options,
	readFile: ReadFile,
): Promise<RawLayer> {
	const prefix = `${name}/`;
	const inner = options.layer?.startsWith(prefix) ? options.layer.slice(prefix.length) : undefined;
	try {
		return await readInside(archive, entry, { ...options, layer: inner }, readFile);
	} catch (error) {
		if (error instanceof Refusal && error.question?.about === 'layer')
			throw prefixed(error, prefix);
		throw error;
	}
}

function prefixed({ code, message, findings, question }: Refusal, prefix: string): Refusal {
	if (!question) return new Refusal(code, message, findings);
	const layers = question.found.layers.map((layer) => ({ ...layer, name: prefix + layer.name }));
	const found = foundLayers(question.found.format, layers);
	const choices = question.choices.map((choice) => {
		const value = prefix + choice.value;
		return { ...choice, value, options: { layer: value } };
	});
	const asked = { ...question, choices, found, likeness: found.likeness };
	return new Refusal(code, message, findings, asked);
}

function readInside(
	archive: ZipArchive,
	entry: ZipEntry,
	options: Options,
	readFile: ReadFile,
): Promise<RawLayer> {
	return readFile(sourceOf(entry.name, archive.unpack(entry)), options);
}

const isShp = (entry: ZipEntry): boolean => /\.shp$/i.test(entry.name);

/** The file's name without folder and ending, and with more of its path where two would be the same. */
function layerName(entry: ZipEntry, entries: ZipEntry[]): string {
	const forms = [
		(name: string) => name.replace(/^.*\//, '').replace(/\.\w+$/, ''),
		(name: string) => name.replace(/\.\w+$/, ''),
		(name: string) => name,
	];
	const form = forms.find((f) => entries.every((e) => e === entry || f(e.name) !== f(entry.name)));
	return (form ?? forms[2])(entry.name);
}

function noMap(archive: ZipArchive): Refusal {
	const names = archive.entries.slice(0, 5).map((entry) => entry.name);
	const message = `The archive holds no shapefile (.shp) or other boundary file but: ${names.join(', ') || 'nothing'}.`;
	return new Refusal('unsupported-format', message);
}
