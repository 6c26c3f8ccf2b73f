/**
 * A drawing as a page of PDF: the same geometry, colours and letters as the SVG painter's, in the same
 * order, as vectors, with the faces carried inside as subsets.
 */
import { cleanText } from '../../sheet/type/clean-text.ts';
import type { Drawing } from '../../sheet/index.ts';
import { lettersOf } from '../letters/glyph-paths.ts';
import type { ExportSource } from '../source.ts';
import { subsetsOf } from '../letters/subsets.ts';
import { PdfLayers } from './layers.ts';
import { PdfPainter } from './painter.ts';
import { SheetDocument } from './sheet-document.ts';

/**
 * The sheet as one PDF page (ISO 32000-1, version 1.7): size exact to a thousandth of a point; layers of
 * the drawing as optional content where asked; title, author, subject, language; a structure tree in
 * which the map is a figure described by the drawing's description and every other text a paragraph.
 * Text is set with the faces given and can be found and copied; halos are outlines, no text. Times and
 * file identifier follow from `about.date`. The same source gives the same bytes. Throws where a face
 * that the sheet uses is not given.
 */
export async function exportPdf(
	{ drawing, about, fonts }: Pick<ExportSource, 'drawing' | 'about' | 'fonts'>,
	{ layers }: { layers: boolean },
): Promise<Uint8Array> {
	const document = new SheetDocument(drawing, about);
	for (const [face, subset] of subsetsOf(drawing, fonts))
		document.registerFont(face, subset as Buffer);
	const book = new PdfLayers(document, layers);
	const painter = new PdfPainter(document, drawing, book, lettersOf(fonts));
	painter.paint();
	book.end();
	attachStructure(document, drawing, painter);
	return document.bytes();
}

/** Title first, then the map, then what stands beside it. */
function attachStructure(document: SheetDocument, drawing: Drawing, painter: PdfPainter): void {
	const { figure, texts } = painter.contents;
	const map = document.struct('Figure', { alt: cleanText(drawing.description) }, figure);
	const said = texts.map(({ tag, content }) => document.struct(tag, {}, [content]));
	const titles = texts.filter(({ tag }) => tag === 'H1').length;
	const children = [...said.slice(0, titles), map, ...said.slice(titles)];
	document.addStructure(document.struct('Document', {}, children));
}
