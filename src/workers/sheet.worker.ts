import { decodeCoverage } from '$lib/engines/boundaries/codec';
import type { Coverage } from '$lib/engines/boundaries/coverage';
import { drawSheet, paintSvg, regionSizesMm } from '$lib/engines/sheet';
import { anchorsOf, placesOn, sharedArcs } from '$lib/state/sheet-places';
import type { DrawReply, DrawRequest } from '$lib/state/drawer';

/**
 * Draws sheets off the page's thread. The first message brings the address of the geometry, which is
 * fetched and unpacked once; each message brings what is to be drawn on it.
 */
let coverage: Promise<Coverage> | null = null;

async function fetchCoverage(address: string): Promise<Coverage> {
	const response = await fetch(address);
	if (!response.ok) throw new Error(`the geometry could not be fetched (${response.status})`);
	return decodeCoverage(new Uint8Array(await response.arrayBuffer()));
}

async function draw(request: DrawRequest): Promise<DrawReply> {
	coverage ??= fetchCoverage(request.geometry);
	const ground = await coverage;
	const drawing = drawSheet({ coverage: ground, ...request.input });
	return {
		id: request.id,
		drawing,
		svg: paintSvg(drawing, { fills: 'attribute', idPrefix: 'sheet-' }),
		anchors: anchorsOf(drawing),
		sizesMm: regionSizesMm(ground, request.input.layout),
		borderArcs: sharedArcs(ground, request.input.borders),
		places: placesOn(drawing, ground, request.places),
	};
}

self.onmessage = async ({ data }: MessageEvent<DrawRequest>) => {
	try {
		self.postMessage(await draw(data));
	} catch (error) {
		coverage = null;
		const failed = error instanceof Error ? error.message : String(error);
		self.postMessage({ id: data.id, failed } satisfies DrawReply);
	}
};
