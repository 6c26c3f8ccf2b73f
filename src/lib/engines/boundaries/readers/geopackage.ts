import type { Cell } from '../attribute-table.ts';
import type { BoundaryOptions, ByteSource, Limits, Watch } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Cancelled, Refusal } from '../refusal.ts';
import { chooseLayer } from './choose-layer.ts';
import { wkbOf } from './gpkg-geometry.ts';
import { gpkgLayers, type GpkgLayer } from './gpkg-layers.ts';
import { quoted, Sqlite, type Value } from './sqlite.ts';
import { wholeFile } from './whole.ts';
import { Wkb } from './wkb.ts';

/** The database stands in memory twice while it is read. */
const mostBytes = 512 * 1024 ** 2;
const format = 'GeoPackage';

type Options = BoundaryOptions & { limits: Limits };

/** One layer of a GeoPackage (OGC 12-128r19), its features in the order of the table. */
export async function readGeoPackage(
	source: ByteSource,
	options: Options,
	watch: Watch,
): Promise<RawLayer> {
	const bytes = await wholeFile(source, Math.min(mostBytes, options.limits.wholeBytes));
	const database = await Sqlite.open(bytes);
	try {
		const layers = gpkgLayers(database);
		const chosen = chooseLayer(format, layers, options.layer);
		const layer = new RawLayer(options.limits, Math.ceil(bytes.length / 32));
		layer.format = format;
		layer.layer = chosen.name;
		layer.layers = layers.map(({ geometryColumn: _, ...found }) => found);
		layer.crs = chosen.crs;
		readTable(database, chosen, layer, options, { bytes: bytes.length, watch });
		return layer;
	} finally {
		database.close();
	}
}

interface Reading {
	/** of the whole file; more bytes than this cannot be stored in it */
	bytes: number;
	watch: Watch;
}

function readTable(
	database: Sqlite,
	{ name, features, geometryColumn }: GpkgLayer,
	layer: RawLayer,
	options: Options,
	{ bytes, watch }: Reading,
): void {
	const all = database.columns(name);
	const isGeometry = (column: { name: string }) =>
		column.name.toLowerCase() === geometryColumn.toLowerCase();
	const geometry = all.find(isGeometry);
	if (!geometry) {
		const message = `Layer "${name}" has no column "${geometryColumn}", where its geometry should be.`;
		throw new Refusal('file-damaged', message);
	}
	// the row number stands last, since it means nothing outside this file
	const columns = all.filter((c) => !isGeometry(c)).sort((p, q) => +p.primary - +q.primary);
	const list = [geometry, ...columns].map((column) => quoted(column.name)).join(', ');
	const ownId = options.keyField === 'id' && !columns.some((column) => column.name === 'id');
	let left = bytes;
	for (const [shape, ...values] of database.rows(`SELECT ${list} FROM ${quoted(name)}`)) {
		if (layer.regions % 1000 === 0) {
			if (watch.cancelled?.()) throw new Cancelled();
			watch.progress?.(
				`Reading features (${layer.regions} so far)`,
				layer.regions / (features || 1),
			);
		}
		layer.startRegion();
		left -= shape instanceof Uint8Array ? shape.length : 0;
		if (left < 0) throw new Refusal('file-damaged', 'The database gives out more than it holds.');
		readShape(shape, layer);
		const row = columns.map(({ name, type }, c) => [name, cellOf(values[c], type)] as const);
		const primary = columns.findIndex((column) => column.primary);
		const id = ownId && primary >= 0 ? cellOf(values[primary], '') : null;
		layer.table.add(typeof id === 'boolean' ? null : id, Object.fromEntries(row));
	}
}

function readShape(shape: Value, layer: RawLayer): void {
	if (shape === null) return;
	const place = `Feature ${layer.regions}`;
	if (!(shape instanceof Uint8Array)) {
		throw new Refusal(
			'file-damaged',
			`${place} has text or a number where its geometry should be.`,
		);
	}
	const wkb = wkbOf(shape, place);
	if (wkb) new Wkb(wkb, layer, place).read();
}

/** Whole numbers too long for a double stay text; bytes are no attribute. */
function cellOf(value: Value, type: string): Cell {
	if (value instanceof Uint8Array) return null;
	if (typeof value !== 'bigint') return value;
	if (/^bool/i.test(type)) return value !== 0n;
	const number = Number(value);
	return Number.isSafeInteger(number) ? number : value.toString();
}
