import type { DrawnText } from '../drawing.ts';
import type { Box } from '../plane/fit.ts';
import type { Face } from '../type/face.ts';
import { textWidth } from '../type/text-width.ts';

/**
 * Parts of the type size: from the top of a line to its baseline, from one baseline to the next, and
 * from the last baseline down. Source: ascender, descender and cap height of the shipped faces
 * (Source Serif 4: caps 0.670; Sofia Sans: caps 0.655).
 */
const rise = 0.74;
const leading = 1.08;
const drop = 0.23;

/** Lines of text set centred under one another. */
export interface TextBox {
	lines: { text: string; width: number }[];
	face: Face;
	size: number;
	width: number;
	height: number;
}

/** `spacing`: what is added between two letters, in the unit of `size`. */
export function textBox(lines: string[], face: Face, size: number, spacing = 0): TextBox {
	const wide = (text: string) =>
		textWidth(face, size, text) + spacing * Math.max(0, [...text].length - 1);
	const set = lines.map((text) => ({ text, width: Math.ceil(wide(text)) }));
	return {
		lines: set,
		face,
		size,
		width: Math.max(...set.map(({ width }) => width)),
		height: Math.ceil(size * (rise + drop + leading * (lines.length - 1))),
	};
}

/** The texts of a box set centred at a place. */
export function setAt(
	{ lines, face, size, height }: TextBox,
	x: number,
	y: number,
	rest: Pick<DrawnText, 'layer' | 'hex'> & Partial<DrawnText>,
): DrawnText[] {
	return lines.map(({ text, width }, i) => ({
		...rest,
		text,
		x: Math.round(x - width / 2),
		y: Math.round(y - height / 2 + size * (rise + leading * i)),
		size,
		width,
		face,
	}));
}

/** The box of every line of a text set centred at a place, `pad` wider and higher in all. */
export function lineBoxes(
	{ lines, size, height }: TextBox,
	x: number,
	y: number,
	pad: number,
): Box[] {
	return lines.map(({ width }, i) => ({
		x: x - (width + pad) / 2,
		y: y - height / 2 + size * leading * i - pad / 2,
		width: width + pad,
		height: size * (rise + drop) + pad,
	}));
}

/** The box that one line of drawn text takes up on the paper. */
export function boxOfText({ x, y, width, size }: DrawnText): Box {
	return { x, y: y - size * rise, width, height: size * (rise + drop) };
}
