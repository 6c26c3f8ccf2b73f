import { gzipSync } from 'fflate';
import { paintSvg, type Drawing, type EmbeddedFace, type Face } from '../sheet/index.ts';
import { base64 } from './base64.ts';
import type { SvgFileOptions } from './kinds.ts';
import { lettersOf } from './letters/glyph-paths.ts';
import { outlineText } from './letters/outline-text.ts';
import { subsetsOf } from './letters/subsets.ts';

/** Whole TrueType files by face, as shipped in static/fonts. */
export type FaceFiles = Partial<Record<Face, Uint8Array>>;

const embed = (drawing: Drawing, files: FaceFiles): EmbeddedFace[] =>
	subsetsOf(drawing, files).map(([face, subset]) => ({
		...{ face, format: 'truetype' as const },
		base64: base64(subset),
	}));

/**
 * The sheet as an SVG file that needs nothing beside it: UTF-8 with an XML declaration; colours by class
 * with a style block, or by attribute; its letters carried inside where `fonts` gives their faces (about
 * 10 to 25 kB a face), drawn as paths, or left to the reader's machine. Byte for byte repeatable.
 */
export function exportSvg(
	drawing: Drawing,
	options: { fonts?: FaceFiles; language?: string; paper?: boolean } & Partial<SvgFileOptions> = {},
): Uint8Array {
	const { fonts = {}, language, paper, colours = 'class', letters = 'embedded' } = options;
	const outlines = lettersOf(fonts);
	const svg = paintSvg(drawing, {
		...{ fills: colours, language, paper },
		...(letters === 'embedded' ? { fonts: embed(drawing, fonts) } : {}),
		...(letters === 'outlines' ? { outline: (text) => outlineText(text, outlines) } : {}),
	});
	return new TextEncoder().encode(`<?xml version="1.0" encoding="UTF-8"?>\n${svg}`);
}

/** Packed by gzip (RFC 1952) without a time, as `.svgz` files are (SVG 2, appendix C). */
export const packSvg = (svg: Uint8Array): Uint8Array => gzipSync(svg, { level: 9, mtime: 0 });
