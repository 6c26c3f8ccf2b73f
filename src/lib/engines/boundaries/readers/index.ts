import type { BoundaryOptions, ByteSource, Limits, Watch } from '../options.ts';
import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';
import { IsTopology, readGeoJson } from './geojson.ts';
import { readTopoJson } from './topojson.ts';
import { firstBytes } from './whole.ts';
import { readZip } from './zipped-shapefile.ts';

/** Reads a file by what it begins with, whatever its name says. */
export async function readLayer(
	source: ByteSource,
	options: BoundaryOptions & { limits: Limits },
	watch: Watch,
): Promise<RawLayer> {
	const first = await firstBytes(source);
	if (startsWith(first, [0x50, 0x4b, 3, 4]) || startsWith(first, [0x50, 0x4b, 5, 6])) {
		return readZip(source, options, watch);
	}
	if (startsWith(first, [0, 0, 0x27, 0x0a])) {
		const message = 'This is a lone .shp file; zip it together with its .dbf, .shx and .prj files.';
		throw new Refusal('unsupported-format', message);
	}
	try {
		return await readGeoJson(source, options.limits, watch);
	} catch (error) {
		if (error instanceof IsTopology) return readTopoJson(source, options);
		throw error;
	}
}

const startsWith = (bytes: Uint8Array, magic: number[]) => magic.every((b, i) => bytes[i] === b);
