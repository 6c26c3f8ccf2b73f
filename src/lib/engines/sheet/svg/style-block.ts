import type { Drawing } from '../drawing.ts';
import { faceStyles, type Face } from '../type/face.ts';
import { uncoloured } from '../draw-sheet.ts';
import { shapesIn } from '../shapes.ts';
import { inkClass } from './paint-shapes.ts';
import type { SvgOptions } from './paint-svg.ts';

/** A face to carry inside the file, as TrueType or WOFF2. */
export interface EmbeddedFace {
	face: Face;
	format: 'truetype' | 'woff2';
	base64: string;
}

function faceRule(face: Face): string {
	const { family, fallback, weight, italic } = faceStyles[face];
	const slant = italic ? ';font-style:italic' : '';
	return `.${face}{font-family:"${family}","${family} Variable",${fallback};font-weight:${weight}${slant}}`;
}

function embedded({ face, format, base64 }: EmbeddedFace): string {
	const { family, weight, italic } = faceStyles[face];
	const type = format === 'woff2' ? 'font/woff2' : 'font/ttf';
	return `@font-face{font-family:"${family}";font-weight:${weight};font-style:${italic ? 'italic' : 'normal'};src:url(data:${type};base64,${base64}) format("${format}")}`;
}

/**
 * The style block: one rule an ink, so that a designer changes a colour in one place, and the faces.
 * Absent when colours are attributes and no face is carried, for pages that allow no style block.
 */
export function styleBlock(drawing: Drawing, { fills, fonts = [], outline }: SvgOptions): string[] {
	const rules = fonts.map(embedded);
	if (fills === 'class') {
		const faces = new Set(drawing.texts.map(({ face }) => face));
		if (!outline) rules.push('text{font-kerning:none;font-variant-ligatures:none}');
		if (!outline) rules.push(...[...faces].sort().map(faceRule));
		rules.push(
			`.ink-0{fill:${uncoloured}}`,
			...drawing.inks.map(({ shown }, ink) => `.ink-${ink + 1}{fill:${shown}}`),
			...hatchRules(drawing),
		);
	}
	return rules.length ? ['<style>', ...rules, '</style>'] : [];
}

/** One rule a hatch, as for the inks. */
function hatchRules(drawing: Drawing): string[] {
	const rules = shapesIn(drawing, 'hatch')
		.filter(({ ink, stroke }) => ink !== undefined && stroke)
		.map((shape) => `.${inkClass(shape)}{stroke:${shape.stroke}}`);
	return [...new Set(rules)];
}
