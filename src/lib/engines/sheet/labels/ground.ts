/** What placing names asks of the paper: who owns a cell, and whether something stands there already. */
import { mostShare, type CellCounts } from './cell-counts.ts';
import type { Box } from '../plane/fit.ts';
import { cellAt, cellsOf, edge, outline, type RegionRaster } from './region-raster.ts';
import type { Leader } from './leader.ts';

export interface Ground {
	raster: RegionRaster;
	/** 1 for cells where something stands: collar furniture first, then names and leaders as they are set */
	busy: Uint8Array;
	/** of the raster */
	counts: CellCounts;
	/** from `headroom`: never above anything that was there before names */
	room: Uint16Array;
	/** frames of insets: a name stands on the same side of each as its region */
	frames: readonly Box[];
}

/** Marks every cell that a box touches as taken; parts off the grid are left out. */
export function occupy({ raster, busy }: Pick<Ground, 'raster' | 'busy'>, box: Box): void {
	const [left, right, top, bottom] = cellsOf(raster, box);
	const [first, last] = [Math.max(0, left), Math.min(raster.columns - 1, right)];
	for (let row = Math.max(0, top); row <= Math.min(raster.rows - 1, bottom); row++) {
		if (last >= first) busy.fill(1, row * raster.columns + first, row * raster.columns + last + 1);
	}
}

/** Whether every cell a box touches has this owner and is free; never for a box that leaves the grid. */
export function isFree({ raster, busy }: Ground, box: Box, wanted: number): boolean {
	const { columns, rows, owner } = raster;
	const [left, right, top, bottom] = cellsOf(raster, box);
	if (left < 0 || top < 0 || right >= columns || bottom >= rows) return false;
	for (let row = top; row <= bottom; row++) {
		for (let i = row * columns + left; i <= row * columns + right; i++) {
			if (owner[i] !== wanted || busy[i]) return false;
		}
	}
	return true;
}

/** Whether a cell is a border of either kind. */
export const isBorder = (owner: number): boolean => owner === outline || owner === edge;

/**
 * Share of a box's cells that are a region's own; 0 where it is surely less than `least`, where anything
 * or an edge is in it, or where it leaves the grid.
 */
export function ownShare(
	{ raster, busy, counts }: Ground,
	box: Box,
	region: number,
	least: number,
): number {
	const { columns, rows, owner } = raster;
	const cells = cellsOf(raster, box);
	const [left, right, top, bottom] = cells;
	if (left < 0 || top < 0 || right >= columns || bottom >= rows) return 0;
	if (mostShare(counts, columns, region, cells) < least) return 0;
	const most = (right - left + 1) * (bottom - top + 1) * (1 - least);
	let [own, others] = [0, 0];
	for (let row = top; row <= bottom; row++) {
		for (let i = row * columns + left; i <= row * columns + right; i++) {
			const at = owner[i];
			if (busy[i] || at === edge) return 0;
			if (at === region) own++;
			// a border is nobody's: neither for nor against
			else if (at !== outline && ++others > most) return 0;
		}
	}
	return own ? own / (own + others) : 0;
}

/** Cells along a line, half a cell apart, from its beginning; -1 off the grid. */
export function* cellsAlong(raster: RegionRaster, { from, to }: Leader): Generator<number> {
	const steps = Math.max(
		1,
		Math.ceil((2 * Math.hypot(to.x - from.x, to.y - from.y)) / raster.cell),
	);
	for (let step = 0; step <= steps; step++) {
		const t = step / steps;
		yield cellAt(raster, from.x + (to.x - from.x) * t, from.y + (to.y - from.y) * t);
	}
}

/** Marks a leader as taken, so that no name and no other leader crosses it. */
export function occupyLine({ raster, busy }: Ground, line: Leader): void {
	for (const cell of cellsAlong(raster, line)) if (cell >= 0) busy[cell] = 1;
}

/** Whether a box lies wholly in the frames that a place lies in, and touches no other. */
export function isWithSame({ frames }: Ground, at: { x: number; y: number }, box: Box): boolean {
	return frames.every(({ x, y, width, height }) => {
		if (at.x > x && at.x < x + width && at.y > y && at.y < y + height) {
			const across = box.x >= x && box.x + box.width <= x + width;
			return across && box.y >= y && box.y + box.height <= y + height;
		}
		const beside = box.x + box.width <= x || box.x >= x + width;
		return beside || box.y + box.height <= y || box.y >= y + height;
	});
}

export const boxAround = (x: number, y: number, width: number, height: number): Box => ({
	x: x - width / 2,
	y: y - height / 2,
	width,
	height,
});
