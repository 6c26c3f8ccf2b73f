import type { Drawing } from '../../sheet/index.ts';
import { dpiLimits, pixelLimit, type ExportOptions } from '../kinds.ts';
import type { ExportSource, ExportTools } from '../source.ts';
import { exportSvg } from '../svg.ts';
import { withPixelSize } from './about-pixels.ts';

/** Pixels of a sheet at so many an inch, or why there cannot be so many. */
export function pixelsOf(
	{ widthMm, heightMm }: Pick<Drawing, 'widthMm' | 'heightMm'>,
	dpi: number,
):
	| { status: 'fits'; width: number; height: number }
	| { status: 'refused'; reason: 'bad-option' | 'too-many-pixels'; message: string } {
	const { least, greatest } = dpiLimits;
	if (!Number.isInteger(dpi) || dpi < least || dpi > greatest) {
		const message = `Pixels an inch are a whole number from ${least} to ${greatest}.`;
		return { status: 'refused', reason: 'bad-option', message };
	}
	const [width, height] = [widthMm, heightMm].map((mm) =>
		Math.max(1, Math.round((mm / 25.4) * dpi)),
	);
	if (width * height <= pixelLimit) return { status: 'fits', width, height };
	const most = Math.floor(Math.sqrt(pixelLimit / (widthMm * heightMm)) * 25.4);
	const message =
		most < least
			? `This paper is too large for a picture; take the PDF or the SVG.`
			: `${inMillions(width * height)} are too many for one picture; up to ${most} pixels an inch fit this paper.`;
	return { status: 'refused', reason: 'too-many-pixels', message };
}

const inMillions = (pixels: number): string => `${Math.round(pixels / 1e6)} million pixels`;

/**
 * The sheet as a picture: letters are drawn as paths from the product's faces, so that no other face can
 * come in; colour space and pixels an inch are told in the file. In: pixels that `pixelsOf` found fit.
 */
export async function exportPng(
	{ drawing, fonts }: Pick<ExportSource, 'drawing' | 'fonts'>,
	{ dpi, ground }: ExportOptions['png'],
	width: number,
	rasterise: NonNullable<ExportTools['rasterise']>,
): Promise<Uint8Array> {
	const svg = exportSvg(drawing, {
		...{ fonts, colours: 'attribute', letters: 'outlines', paper: false },
	});
	return withPixelSize(await rasterise(svg, width, ground === 'white' ? '#ffffff' : null), dpi);
}
