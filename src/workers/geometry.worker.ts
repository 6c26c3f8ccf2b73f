import { decodeCoverage } from '$lib/engines/boundaries/codec';
import { unitGeometry } from '$lib/engines/territories';
import type { GeometryReply } from '$lib/state/region-geometry';

/** Where the regions of a sheet lie and how large they are, worked out once off the page's thread. */
async function geometryOf(address: string): Promise<GeometryReply> {
	const response = await fetch(address);
	if (!response.ok) return { failed: `the geometry could not be fetched (${response.status})` };
	return unitGeometry(decodeCoverage(new Uint8Array(await response.arrayBuffer())));
}

self.onmessage = async ({ data }: MessageEvent<string>) => {
	const reply = await geometryOf(data).catch((error: unknown) => ({ failed: String(error) }));
	self.postMessage(reply);
};
