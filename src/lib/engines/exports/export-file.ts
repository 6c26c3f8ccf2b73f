import { exportCsv } from './csv.ts';
import { exportGeoJson } from './geojson.ts';
import { exportKind, plainOptions, type ExportKindId, type ExportOptions } from './kinds.ts';
import type { ExportOutcome, ExportSource, ExportTools } from './source.ts';
import { exportSvg } from './svg.ts';

/**
 * A sheet as one file of a kind. In: the source, options that may be partial (`plainOptions` gives the
 * rest), and tools for what an engine cannot do (a PNG needs `rasterise`). Out: the file, the same bytes
 * for the same input, or why there is none. Throws where a tool is missing, a programmer's error.
 */
export async function exportFile<K extends ExportKindId>(
	id: K,
	source: ExportSource,
	options: Partial<ExportOptions[K]> = {},
	_tools: ExportTools = {},
): Promise<ExportOutcome> {
	const asked = { ...plainOptions[id], ...options };
	const bytes = bytesOf(id, source, asked);
	const { extension, mediaType } = exportKind(id);
	const name = `${source.about.stem}.${extension}`;
	return { status: 'made', file: { name, mediaType, bytes, notes: [] } };
}

function bytesOf<K extends ExportKindId>(
	id: K,
	{ drawing, coverage, rows, fonts }: ExportSource,
	_options: ExportOptions[K],
): Uint8Array {
	if (id === 'geojson') return exportGeoJson(coverage, rows);
	if (id === 'csv') return exportCsv(rows, { byteOrderMark: true });
	if (id === 'svg') return exportSvg(drawing, { fonts });
	throw new RangeError(`no file of kind ${id}`);
}
