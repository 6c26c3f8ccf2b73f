/**
 * A drawing as SVG: the same text on screen, on the server and in the file. Layers are groups with
 * names; every region is one path with an id, its key, its name and its ink; colours are attributes
 * or classes. No script, no style attribute, nothing outside the file.
 */
import type { DrawnText, Drawing } from '../drawing.ts';
import { shapeLayersOver, shapeLayersTop, shapeLayersUnder } from '../shapes.ts';
import { escapeXml } from './escape.ts';
import { paintFills } from './paint-fills.ts';
import { paintShapes } from './paint-shapes.ts';
import { paintHalos, paintTexts } from './paint-texts.ts';
import { chainsPath, linesPath } from './path-data.ts';
import { styleBlock } from './style-block.ts';
import type { EmbeddedFace } from './style-block.ts';

export interface SvgOptions {
	/** colours as presentation attributes, or as classes `ink-1`, `ink-2`, ... with a style block */
	fills: 'attribute' | 'class';
	/** put before every id, where several drawings share a page */
	idPrefix?: string;
	/** regions can be reached by script and keyboard: `tabindex="-1"` on each */
	interactive?: boolean;
	/** faces to carry inside the file; the page or the reader's machine provides them otherwise */
	fonts?: EmbeddedFace[];
	/** path data of a text's letters, where they are to be drawn and not set */
	outline?: (text: DrawnText) => string;
	/** language of the sheet (BCP 47), for whoever reads it aloud */
	language?: string;
	/** false leaves out the white of the paper */
	paper?: boolean;
}

/** Layers of lines under their names in the file. */
const lineNames: Record<string, string> = {
	region: 'borders-region',
	group: 'borders-group',
	outer: 'borders-outer',
	weak: 'weak',
	'weak-core': 'weak-core',
	leader: 'leaders',
};

/**
 * Paints a drawing. Out: one `<svg>` element, whose user unit is a hundredth of a millimetre, with
 * every name escaped. Byte for byte the same for the same drawing and options.
 */
export function paintSvg(drawing: Drawing, options: SvgOptions): string {
	const { widthMm, heightMm } = drawing;
	const prefix = options.idPrefix ?? '';
	const size = `${Math.round(widthMm * 100)} ${Math.round(heightMm * 100)}`;
	const language = options.language ? ` xml:lang="${escapeXml(options.language)}"` : '';
	return [
		`<svg xmlns="http://www.w3.org/2000/svg"${language} viewBox="0 0 ${size}" width="${widthMm}mm" height="${heightMm}mm" role="graphics-document" aria-labelledby="${escapeXml(prefix)}title ${escapeXml(prefix)}description">`,
		`<title id="${escapeXml(prefix)}title">${escapeXml(drawing.title)}</title>`,
		`<desc id="${escapeXml(prefix)}description">${escapeXml(drawing.description)}</desc>`,
		...styleBlock(drawing, options),
		...(options.paper === false
			? []
			: [`<rect id="${escapeXml(prefix)}paper" width="100%" height="100%" fill="#ffffff"/>`]),
		...paintShapes(drawing, shapeLayersUnder, options),
		...layer(prefix, 'fills', ' stroke="none"', paintFills(drawing, options)),
		...paintShapes(drawing, shapeLayersOver, options),
		...halos(drawing, options),
		...paintLines(drawing, prefix),
		...paintShapes(drawing, frameLayers, options),
		...mapTexts(drawing, options, 'graticule', 'graticule-figures'),
		...mapTexts(drawing, options, 'water', 'water-names'),
		...layer(prefix, 'labels', ' aria-hidden="true"', paintTexts(drawing, ['label'], options)),
		...layer(prefix, 'collar', '', [
			...paintRects(drawing),
			...paintShapes(drawing, ['legend'], options),
			...paintTexts(drawing, ['title', 'collar', 'legend'], options),
		]),
		...mapTexts(drawing, options, 'block', 'text-blocks'),
		'</svg>',
		'',
	].join('\n');
}

/** Samples in the legend lie on its boxes, so they are painted with the collar. */
const frameLayers = shapeLayersTop.filter((name) => name !== 'legend');

/** Under the border lines, which stay whole where a name goes over one. */
function halos(drawing: Drawing, options: SvgOptions): string[] {
	const painted = paintHalos(drawing, options);
	const prefix = options.idPrefix ?? '';
	return painted.length ? layer(prefix, 'halos', ' aria-hidden="true"', painted) : [];
}

/** Texts of a layer that not every sheet has, as a group of their own. */
function mapTexts(drawing: Drawing, options: SvgOptions, kind: DrawnText['layer'], name: string) {
	const texts = paintTexts(drawing, [kind], options);
	const hidden = kind === 'block' ? '' : ' aria-hidden="true"';
	return texts.length ? layer(options.idPrefix ?? '', name, hidden, texts) : [];
}

function layer(prefix: string, name: string, attributes: string, content: string[]): string[] {
	return [`<g id="${escapeXml(prefix)}${name}"${attributes}>`, ...content, '</g>'];
}

function paintLines(drawing: Drawing, prefix: string): string[] {
	const lines = drawing.lines.map(({ rank, width, hex, dash, arcs, chains }) => {
		const dashes = dash ? ` stroke-dasharray="${dash.join(' ')}"` : '';
		const name = lineNames[rank] ?? rank;
		const path = chains ? chainsPath(drawing, chains) : linesPath(drawing, arcs);
		// round ends would close the gaps of a fine dash
		const cap = dash ? ' stroke-linecap="butt"' : '';
		return `<g id="${escapeXml(prefix + name)}" stroke="${hex}" stroke-width="${width}"${dashes}${cap}><path d="${path}"/></g>`;
	});
	const attributes =
		' fill="none" stroke-linejoin="round" stroke-linecap="round" aria-hidden="true"';
	return layer(prefix, 'borders', attributes, lines);
}

function paintRects({ rects }: Drawing): string[] {
	return rects.map(({ layer: name, x, y, width, height, fill, stroke, strokeWidth }) => {
		const outline = stroke ? ` stroke="${stroke}" stroke-width="${strokeWidth}"` : '';
		return `<rect class="${name}" x="${x}" y="${y}" width="${width}" height="${height}" fill="${fill ?? 'none'}"${outline}/>`;
	});
}
