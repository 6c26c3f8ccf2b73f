import type { FoundLayer } from '../question.ts';
import type { Limits } from '../options.ts';
import { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { dbfRows, openDbf } from './dbf.ts';
import { isPolygonShp } from './shp-check.ts';
import { readShp } from './shp.ts';
import { textEncoding } from './text-encoding.ts';
import type { ZipArchive } from './zip.ts';
import type { ZipEntry } from './zip-directory.ts';

/** What an archive's .shp file is called and declares, read from the first bytes of its parts. */
export function shapefileLayer(archive: ZipArchive, shp: ZipEntry, name: string): FoundLayer {
	const dbf = beside(archive, shp, '.dbf');
	const head = dbf ? archive.head(dbf, 8) : null;
	const features = head?.length === 8 ? new DataView(head.slice().buffer).getUint32(4, true) : null;
	return {
		name,
		features,
		areas: isPolygonShp(archive.head(shp, 100)),
		crs: textBeside(archive, shp, '.prj'),
	};
}

/** One shapefile of an archive: outlines, table and coordinate system. */
export async function readShapefile(
	archive: ZipArchive,
	shp: ZipEntry,
	limits: Limits,
): Promise<RawLayer> {
	const bytes = archive.unpack(shp);
	const layer = new RawLayer(limits, Math.ceil(bytes.length / 16));
	layer.crs = textBeside(archive, shp, '.prj');
	await readShp(bytes, layer);
	const dbf = beside(archive, shp, '.dbf');
	const cpg = textBeside(archive, shp, '.cpg');
	if (dbf) await readTable(archive.unpack(dbf), cpg, layer);
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

const beside = (archive: ZipArchive, shp: ZipEntry, ending: string) =>
	archive.find(shp.name.replace(/\.shp$/i, ending));

/** More than any definition of a system or name of an encoding has. */
const mostTextBytes = 64 * 1024;

function textBeside(archive: ZipArchive, shp: ZipEntry, ending: string): string | null {
	const entry = beside(archive, shp, ending);
	if (!entry) return null;
	if (entry.declaredBytes > mostTextBytes) {
		const message = `"${entry.name}" has ${entry.declaredBytes} bytes, more than such a file can have.`;
		throw new Refusal('too-large-unpacked', message);
	}
	return new TextDecoder().decode(archive.unpack(entry)).trim();
}
