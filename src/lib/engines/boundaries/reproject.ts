import type { BoundaryOptions } from './options.ts';
import type { RawLayer } from './raw-layer.ts';

export function reproject(layer: RawLayer, options: BoundaryOptions): string {
	return options.crs ?? layer.crs ?? 'EPSG:4326';
}
