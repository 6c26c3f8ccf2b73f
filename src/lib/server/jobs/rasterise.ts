import { Resvg } from '@resvg/resvg-js';

/**
 * Paints an SVG in pixels with a library of native code, which is why it stands here and not in an
 * engine. In: an SVG whose letters are paths, the width in pixels, the colour under it or null for none.
 * Out: a PNG, eight bits a channel with alpha; the same bytes for the same input. No face of this machine
 * is loaded. Memory: four bytes a pixel, and as much again while the picture is packed.
 */
export function rasterise(
	svg: Uint8Array,
	width: number,
	ground: string | null,
): Promise<Uint8Array> {
	const resvg = new Resvg(Buffer.from(svg.buffer, svg.byteOffset, svg.byteLength), {
		fitTo: { mode: 'width', value: width },
		font: { loadSystemFonts: false },
		...(ground ? { background: ground } : {}),
	});
	return Promise.resolve(new Uint8Array(resvg.render().asPng()));
}
