import type { RawLayer } from '../raw-layer.ts';
import type { BoundaryOptions, ByteSource, Limits, Watch } from '../options.ts';
import { readGeoJson } from './geojson.ts';

export async function readLayer(
	source: ByteSource,
	options: BoundaryOptions & { limits: Limits },
	watch: Watch,
): Promise<RawLayer> {
	return readGeoJson(source, options.limits, watch);
}
