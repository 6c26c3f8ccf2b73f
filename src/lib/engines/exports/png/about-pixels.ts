import { readChunks, writeChunks, type Chunk } from './chunks.ts';

const perMetre = (dpi: number): number => Math.round(dpi / 0.0254);

/** How many pixels a metre, both ways (PNG third edition, 11.3.4.3). */
function sizeChunk(dpi: number): Chunk {
	const data = new Uint8Array(9);
	const view = new DataView(data.buffer);
	view.setUint32(0, perMetre(dpi));
	view.setUint32(4, perMetre(dpi));
	data[8] = 1;
	return { type: 'pHYs', data };
}

/** Colours are those of sRGB, relative colorimetric: inks come out as they were chosen (11.3.2.5). */
const colours: Chunk = { type: 'sRGB', data: Uint8Array.of(1) };

/** Text without any time in it (11.3.3.2): Latin letters only, so it says no name of the sheet. */
const words = (keyword: string, text: string): Chunk => ({
	type: 'tEXt',
	data: new TextEncoder().encode(`${keyword}\0${text}`),
});

/**
 * The same picture with its size on paper and its colour space told, before the pixels as the standard
 * wants them (5.6). In: a PNG file and its pixels an inch. What it said of these before is dropped.
 */
export function withPixelSize(png: Uint8Array, dpi: number): Uint8Array {
	const [head, ...rest] = readChunks(png).filter(({ type }) => !told.has(type));
	return writeChunks([head, colours, sizeChunk(dpi), words('Software', 'Merestone'), ...rest]);
}

const told: ReadonlySet<string> = new Set([
	'pHYs',
	'sRGB',
	'gAMA',
	'cHRM',
	'iCCP',
	'cICP',
	'tIME',
	'tEXt',
]);
