import type { RawLayer } from './raw-layer.ts';

export function placeLongitudes(_layer: RawLayer): number {
	return -180;
}
