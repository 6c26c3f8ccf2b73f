import type { DrawnText } from '../drawing.ts';
import type { Face } from '../type/face.ts';
import { textWidth } from '../type/text-width.ts';
import { shortened, wrapText } from '../type/wrap-text.ts';

/** A block of lines under one another; `height` is what it takes up on the sheet. */
export interface Block {
	texts: DrawnText[];
	height: number;
}

export interface Style {
	face: Face;
	size: number;
	layer: 'title' | 'collar';
	/** lines beyond these are cut off with an ellipsis */
	most: number;
	leading: number;
}

/** Text set in lines of a width, from the top edge `y` down; nothing where the text is empty. */
export function setBlock(text: string, style: Style, x: number, y: number, width: number): Block {
	const { face, size, layer, most, leading } = style;
	const lines = wrapText(face, size, text, width);
	const kept = lines.slice(0, most);
	if (lines.length > most) kept[most - 1] = shortened(face, size, `${kept[most - 1]}…`, width);
	const texts = kept.map((line, i) => ({
		layer,
		text: line,
		x,
		y: Math.round(y + size * (0.78 + leading * i)),
		size,
		width: Math.ceil(textWidth(face, size, line)),
		face,
		hex: '#000000',
	}));
	return { texts, height: kept.length ? Math.ceil(size * (1 + leading * (kept.length - 1))) : 0 };
}

/** Title sizes on A4 in hundredths of a millimetre: 16 point, or less where that saves a line. */
const titleSizes = [565, 500, 440, 390, 340];
const subtitleSize = 335;

/**
 * Title and subtitle in the upper left: the title in one line as large as it goes, else in up to
 * three lines of the smallest size.
 */
export function heading(
	title: string,
	subtitle: string,
	scale: number,
	x: number,
	y: number,
	width: number,
): Block {
	const sizes = titleSizes.map((size) => Math.round(size * scale));
	const size =
		sizes.find((one) => textWidth('serif-bold', one, title) <= width) ?? sizes[sizes.length - 1];
	const top = setBlock(
		title,
		{ face: 'serif-bold', size, layer: 'title', most: 3, leading: 1.15 },
		x,
		y,
		width,
	);
	const air = top.height ? Math.round(size * 0.3) : 0;
	const below = setBlock(
		subtitle,
		{
			face: 'serif-italic',
			size: Math.min(Math.round(subtitleSize * scale), size),
			layer: 'title',
			most: 2,
			leading: 1.2,
		},
		x,
		y + top.height + air,
		width,
	);
	return {
		texts: [...top.texts, ...below.texts],
		height: top.height + (below.height ? air + below.height : 0),
	};
}
