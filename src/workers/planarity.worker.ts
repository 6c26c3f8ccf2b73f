import { crossedBorders } from '$lib/engines/borders/planarity';
import type { PlanarityReply, PlanarityRequest } from '$lib/state/flatness.svelte';

/** Whether a sheet's counted borders can be drawn in a plane, judged off the page's thread. */
self.onmessage = ({ data }: MessageEvent<PlanarityRequest>) => self.postMessage(judged(data));

function judged({ id, regions, a, b }: PlanarityRequest): PlanarityReply {
	try {
		return { id, crossed: crossedBorders(regions, { a, b }) };
	} catch (error) {
		return { id, failed: error instanceof Error ? error.message : String(error) };
	}
}
