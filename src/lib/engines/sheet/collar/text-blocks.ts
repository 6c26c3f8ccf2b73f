import type { DrawnText } from '../drawing.ts';
import type { TextBlock } from '../layout/collar.ts';
import { hundredths } from '../paper.ts';
import type { Box } from '../plane/fit.ts';
import type { DrawnShape } from '../shapes.ts';
import type { Face } from '../type/face.ts';
import { cleanText } from '../type/clean-text.ts';
import { textWidth } from '../type/text-width.ts';
import { shortened, wrapText } from '../type/wrap-text.ts';

/** Hundredths of a millimetre to a point of type, a seventy-second of an inch. */
export const hundredthsPerPoint = 2540 / 72;

/** Parts of the type size: from one baseline to the next, and from the top of a line to its baseline. */
const leading = 1.25;
const rise = 0.78;
/** White around the letters of a block that has a ground. */
const groundAir = 0.35;

export interface SetTextBlock {
	texts: DrawnText[];
	/** the ground under it, if it has one */
	ground: DrawnShape | null;
	/** what it takes up on the paper */
	box: Box;
}

/**
 * Text blocks on the paper. In: blocks in mm from the paper's upper left corner; the paper, and the box of
 * the caution, in hundredths of a millimetre. Out: for every block that says something, its lines, no wider
 * than the block, and its box, which is moved just far enough to lie on the paper and above the caution. What
 * finds no room above the caution is left out, and an ellipsis says so.
 */
export function textBlocks(blocks: readonly TextBlock[], paper: Box, caution: Box): SetTextBlock[] {
	return blocks.flatMap((block) => {
		const size = Math.max(50, Math.round(block.sizePt * hundredthsPerPoint));
		const width = Math.min(hundredths(block.widthMm), paper.width);
		const lines = block.text
			.split(/\r\n|\r|\n/)
			.map(cleanText)
			.flatMap((line) => (line ? wrapText(block.face, size, line, width) : ['']));
		while (lines.length && lines[lines.length - 1] === '') lines.pop();
		if (!lines.some(Boolean)) return [];
		return [setOne(block, lines, size, width, paper, caution)];
	});
}

function setOne(
	block: TextBlock,
	all: string[],
	size: number,
	width: number,
	paper: Box,
	caution: Box,
): SetTextBlock {
	const air = block.ground ? Math.round(size * groundAir) : 0;
	const room = (caution.y || paper.height) - 2 * air;
	const lines = cutTo(all, Math.floor((room / size - 1.02) / leading) + 1, block.face, size, width);
	const wide = Math.ceil(Math.max(...lines.map((line) => textWidth(block.face, size, line))));
	const high = Math.ceil(size * (1.02 + leading * (lines.length - 1)));
	const wanted = {
		x: hundredths(block.xMm) - air,
		y: hundredths(block.yMm) - air,
		width: Math.min(wide, width) + 2 * air,
		height: high + 2 * air,
	};
	const box = above(onPaper(wanted, paper), caution);
	const texts = lines.flatMap((text, i) => {
		const across = Math.ceil(textWidth(block.face, size, text));
		const y = Math.round(box.y + air + size * (rise + leading * i));
		const { face } = block;
		const drawn = { text, x: box.x + air, y, size, width: across, face, hex: '#000000' };
		return text ? [{ layer: 'block' as const, ...drawn }] : [];
	});
	return { texts, ground: block.ground ? whiteGround(box) : null, box };
}

function cutTo(lines: string[], most: number, face: Face, size: number, width: number): string[] {
	if (lines.length <= most) return lines;
	const kept = lines.slice(0, Math.max(1, most));
	const last = kept.pop() ?? '';
	return [...kept, shortened(face, size, `${last}…`, width)];
}

function onPaper(box: Box, paper: Box): Box {
	const held = (at: number, size: number, least: number, room: number) =>
		Math.max(least, Math.min(at, least + room - size));
	return {
		...box,
		x: held(box.x, box.width, paper.x, paper.width),
		y: held(box.y, box.height, paper.y, paper.height),
	};
}

/** A block that would touch the caution stands above it; the caution is never covered. */
function above(box: Box, caution: Box): Box {
	const apart =
		box.x >= caution.x + caution.width ||
		box.x + box.width <= caution.x ||
		box.y >= caution.y + caution.height ||
		box.y + box.height <= caution.y;
	return apart ? box : { ...box, y: Math.max(0, caution.y - box.height) };
}

/** A white rectangle that hides what lies under a text. */
function whiteGround({ x, y, width, height }: Box): DrawnShape {
	return {
		layer: 'ground',
		points: Int32Array.of(x, y, x + width, y, x + width, y + height, x, y + height),
		starts: Uint32Array.of(0, 4),
		closed: true,
		fill: '#ffffff',
		stroke: null,
		strokeWidth: 0,
	};
}
