import { decodeCoverage } from '$lib/engines/boundaries/codec';
import type { Coverage } from '$lib/engines/boundaries/coverage';
import {
	drawPlaced,
	groundOf,
	paintSvg,
	refineGround,
	regionSizesMm,
	type Ground,
	type Placement,
} from '$lib/engines/sheet';
import type { DrawReply, DrawRequest, Drawn, RefineRequest, WarmRequest } from '$lib/state/drawer';
import { packFills } from '$lib/state/packed-fills';
import { anchorsOf, placesOn, sharedArcs } from '$lib/state/sheet-places';

/**
 * Draws sheets off the page's thread. Geometry is fetched and unpacked when it is first asked for; what
 * was drawn last is kept, so that finer lines can be laid into it.
 */
const fetched = new Map<string, Promise<Coverage>>();
let last: { ground: Ground; placement: Placement } | null = null;

/** The level that is drawn and one finer level are kept. */
function coverageAt(address: string, drawn: string): Promise<Coverage> {
	for (const other of fetched.keys())
		if (other !== address && other !== drawn) fetched.delete(other);
	const known = fetched.get(address) ?? fetchCoverage(address);
	fetched.set(address, known);
	return known;
}
let drawnFrom = '';

async function fetchCoverage(address: string): Promise<Coverage> {
	const response = await fetch(address);
	if (!response.ok) throw new Error(`the geometry could not be fetched (${response.status})`);
	return decodeCoverage(new Uint8Array(await response.arrayBuffer()));
}

async function draw({ id, geometry, onCanvas, input, places }: DrawRequest): Promise<Drawn> {
	drawnFrom = geometry;
	const coverage = await coverageAt(geometry, geometry);
	const { drawing, placement } = drawPlaced({ coverage, ...input, bare: onCanvas });
	const ground = onCanvas ? groundOf(drawing) : null;
	last = ground && { ground, placement };
	const found = {
		anchors: anchorsOf(drawing),
		borderArcs: ground ? null : sharedArcs(coverage, input.borders),
		places: placesOn(drawing, coverage, places),
	};
	return {
		id,
		// tens of thousands of objects take longer on their way than all their lines
		drawing: ground ? { ...drawing, fills: [] } : drawing,
		fills: ground && packFills(drawing.fills),
		svg: ground ? '' : paintSvg(drawing, { fills: 'attribute', idPrefix: 'sheet-' }),
		ground,
		sizesMm: ground ? null : regionSizesMm(coverage, input.layout, input.inks),
		unitsPerMetre: placement.fit.scale / earthMetres,
		...found,
	};
}
/** mean radius of the earth, by which plane lengths are measured before they are fitted to the paper */
const earthMetres = 6_371_008.8;

async function refine({ id, finer, area }: RefineRequest): Promise<DrawReply> {
	if (!last) throw new Error('nothing is drawn that could be made finer');
	const { ground, placement } = last;
	const coverage = await coverageAt(finer, drawnFrom);
	return { id, area, finer, refined: refineGround(ground, coverage, placement, area) };
}

async function answer(request: DrawRequest | RefineRequest): Promise<void> {
	if ('finer' in request) return self.postMessage(await refine(request));
	self.postMessage(await draw(request));
	if (!request.onCanvas) return;
	// the first tiles are painted meanwhile: nobody waits for what follows
	await new Promise((resolve) => setTimeout(resolve, aside));
	const { geometry, input } = request;
	const coverage = await coverageAt(geometry, geometry);
	const sizesMm = regionSizesMm(coverage, input.layout, input.inks);
	const borderArcs = sharedArcs(coverage, input.borders);
	self.postMessage({ id: request.id, sizesMm, borderArcs } satisfies DrawReply);
}
/** milliseconds */
const aside = 1_000;

/** Has the geometry at hand before a drawing is asked for; a fault is told by the drawing, which asks again. */
async function warm({ warm: address }: WarmRequest): Promise<void> {
	drawnFrom = address;
	await coverageAt(address, address).catch(() => fetched.delete(address));
}

self.onmessage = async ({ data }: MessageEvent<DrawRequest | RefineRequest | WarmRequest>) => {
	if ('warm' in data) return warm(data);
	try {
		await answer(data);
	} catch (error) {
		fetched.clear();
		const failed = error instanceof Error ? error.message : String(error);
		self.postMessage({ id: data.id, failed } satisfies DrawReply);
	}
};
