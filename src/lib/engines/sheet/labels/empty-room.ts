import type { Box } from '../plane/fit.ts';
import type { Ground } from './ground.ts';
import { cellsOf, paper } from './region-raster.ts';

/** Squares the map's box is looked at in, along its longer side. */
const squares = 160;

/** 1 for squares in which nothing lies, row by row; what is within an inset is no room of the map's. */
function emptySquares({ raster, busy, frames }: Ground) {
	const { columns, rows, owner, cell } = raster;
	const side = Math.max(1, Math.ceil(Math.max(columns, rows) / squares));
	const [wide, high] = [Math.floor(columns / side), Math.floor(rows / side)];
	const empty = new Uint8Array(wide * high).fill(1);
	for (let row = 0; row < high * side; row++) {
		for (let column = 0; column < wide * side; column++) {
			const i = row * columns + column;
			if (owner[i] === paper && !busy[i]) continue;
			empty[Math.floor(row / side) * wide + Math.floor(column / side)] = 0;
		}
	}
	for (const frame of frames) {
		const [left, right, top, bottom] = cellsOf(raster, frame).map((at) => Math.floor(at / side));
		for (let row = Math.max(0, top); row <= Math.min(bottom, high - 1); row++) {
			if (right >= 0 && left < wide)
				empty.fill(0, row * wide + Math.max(0, left), row * wide + Math.min(right + 1, wide));
		}
	}
	return { empty, wide, high, side: side * cell };
}

/**
 * The rectangle of empty paper that is worth most by a measure of its width and height, which grows
 * with both; null where none is worth anything. Every largest rectangle is looked at once: for each
 * row, spans under a falling height of empty squares. Source of the method: the largest rectangle in a
 * histogram, by a stack; common knowledge, no source.
 */
export function emptyRoom(
	ground: Ground,
	worth: (width: number, height: number) => number,
): Box | null {
	const { empty, wide, high, side } = emptySquares(ground);
	const { x, y } = ground.raster;
	const heights = new Uint16Array(wide + 1);
	let best: Box | null = null;
	let most = 0;
	for (let row = 0; row < high; row++) {
		for (let column = 0; column < wide; column++) {
			heights[column] = empty[row * wide + column] ? heights[column] + 1 : 0;
		}
		const open: { from: number; height: number }[] = [];
		for (let column = 0; column <= wide; column++) {
			let from = column;
			while (open.length && open[open.length - 1].height >= heights[column]) {
				const span = open.pop()!;
				const [width, height] = [(column - span.from) * side, span.height * side];
				const value = worth(width, height);
				from = span.from;
				if (value <= most) continue;
				most = value;
				best = { x: x + from * side, y: y + (row + 1) * side - height, width, height };
			}
			if (heights[column]) open.push({ from, height: heights[column] });
		}
	}
	return best;
}
