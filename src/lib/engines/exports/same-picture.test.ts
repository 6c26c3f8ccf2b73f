import { Resvg } from '@resvg/resvg-js';
import { PNG } from 'pngjs';
import { beforeAll, describe, expect, it } from 'vitest';
import { difference } from '../../../../tests/support/compare-pictures.ts';
import { fonts, hatchedInks, sourceOf } from '../../../../tests/support/export-source.ts';
import { pdfPicture } from '../../../../tests/support/poppler.ts';
import { countiesCoverage, layout, statesCoverage } from '../../../../tests/support/sheets.ts';
import { rasterise } from '../../server/jobs/rasterise.ts';
import { faceStyles } from '../sheet/index.ts';
import type { ExportSource } from './index.ts';
import { exportPdf } from './pdf/pdf.ts';
import { exportPng, pixelsOf } from './png/png.ts';
import { exportSvg } from './svg.ts';

/** five pixels a millimetre, so that no painter has to round the paper */
const dpi = 127;
/** Edges are smoothed in other ways: half of full contrast on an edge's own pixels is no other picture. */
const slack = 127;

/** The SVG with text as text, set by resvg 2.6.2 from the font files: no outlines of ours. */
function svgPicture({ drawing }: ExportSource, width: number): PNG {
	const svg = exportSvg(drawing, { fonts, colours: 'class', letters: 'plain' });
	const files = Object.keys(faceStyles).map((face) => `static/fonts/${face}.ttf`);
	const resvg = new Resvg(Buffer.from(svg), {
		fitTo: { mode: 'width', value: width },
		font: { loadSystemFonts: false, fontFiles: files },
	});
	return PNG.sync.read(resvg.render().asPng());
}

describe.each([
	['49 states with hatches', () => sourceOf(statesCoverage(), { inks: hatchedInks })],
	[
		'49 states in a sea, framed',
		() =>
			sourceOf(statesCoverage(), {
				layout: { ...layout, frame: { ...layout.frame, sea: '#cfe0ea', neatLine: true } },
			}),
	],
	[
		'49 states parted by wide dashes',
		() =>
			sourceOf(statesCoverage(), {
				layout: {
					...layout,
					lines: { ...layout.lines, region: { widthMm: 1, hex: '#000000', dashMm: [3, 2] } },
				},
			}),
	],
	['3,108 counties', () => sourceOf(countiesCoverage())],
])('%s', (name, make) => {
	const pictures: Record<string, PNG> = {};

	beforeAll(async () => {
		const source = make();
		const pixels = pixelsOf(source.drawing, dpi);
		if (pixels.status === 'refused') throw new Error(pixels.message);
		pictures.svg = svgPicture(source, pixels.width);
		const png = await exportPng(source, { dpi, ground: 'white' }, pixels.width, rasterise);
		pictures.png = PNG.sync.read(Buffer.from(png));
		pictures.pdf = fitted(pdfPicture(await exportPdf(source, { layers: true }), dpi), pixels);
	}, 240_000);

	it('is the same picture as SVG, text set as text, and as PNG', () => {
		const found = difference(pictures.svg, pictures.png, slack);
		expect(found.share, name).toBeLessThan(0.0002);
		expect(found.mean, name).toBeLessThan(0.2);
	});

	it('is the same picture as PDF, painted by pdftoppm, and as PNG', () => {
		const found = difference(pictures.pdf, pictures.png, slack);
		expect(found.share, name).toBeLessThan(0.005);
		expect(found.mean, name).toBeLessThan(5);
	});

	it('is told from the same sheet moved by half a millimetre', () => {
		const { width, height } = pictures.png;
		const moved = new PNG({ width, height });
		PNG.bitblt(pictures.png, moved, 3, 0, width - 3, height, 0, 0);
		expect(difference(moved, pictures.png, slack).share).toBeGreaterThan(0.01);
	});
});

/** pdftoppm rounds any part of a pixel up, and a millionth of a point is one: what is over is cut off. */
function fitted(picture: PNG, { width, height }: { width: number; height: number }): PNG {
	const cut = new PNG({ width, height });
	PNG.bitblt(picture, cut, 0, 0, width, height, 0, 0);
	return cut;
}
