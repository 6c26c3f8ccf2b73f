import { Resvg } from '@resvg/resvg-js';

/**
 * Paints an SVG in pixels. In: an SVG that needs no fonts, its width in pixels, and the colour under it or
 * null for none. Out: a PNG. Fonts of the machine are never looked at, so that every machine paints alike.
 */
export async function rasterise(
	svg: Uint8Array,
	width: number,
	ground: string | null,
): Promise<Uint8Array> {
	const painter = new Resvg(Buffer.from(svg), {
		fitTo: { mode: 'width', value: width },
		font: { loadSystemFonts: false },
		...(ground && { background: ground }),
	});
	return painter.render().asPng();
}
