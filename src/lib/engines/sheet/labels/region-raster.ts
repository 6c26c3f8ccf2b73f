/**
 * Which region covers which part of the paper, as a grid of cells. Lettering asks it whether a box
 * lies wholly inside a region or wholly on empty paper: one look-up a cell, exact to a cell.
 *
 * Built by even-odd scan lines through cell centres; cells that an outline passes through belong to
 * nobody, so that no lettering stands on a border, a speck or an inlet.
 */
import { ringPoints } from '../fills.ts';
import type { Box } from '../plane/fit.ts';
import type { SheetArcs } from '../plane/quantise.ts';

/** Cell values that are no region. */
export const paper = -1;
export const outline = -3;
/** A coast, or a border of the level above: no name lies across one. */
export const edge = -4;

export interface RegionRaster {
	/** side of a cell, hundredths of a millimetre */
	cell: number;
	columns: number;
	rows: number;
	/** upper left corner */
	x: number;
	y: number;
	/** region number, `paper`, `outline` or `edge`, row by row */
	owner: Int32Array;
	/** columns and rows each region spans: left, right, top, bottom; right and bottom included */
	spans: Int32Array;
}

type Border = typeof outline | typeof edge | null;

/** Most cells in a grid: 7 bytes each with what is kept beside it, some milliseconds to read through. */
const mostCells = 3_000_000;

/**
 * In: the rings of every region, and what each arc is: the outline of one, an edge, or nothing. Rings of several regions given
 * as one region melt together, for their common borders cancel.
 */
export function rasterise(
	arcs: SheetArcs,
	regions: Int32Array[][],
	box: Box,
	bounds: (arc: number) => Border = () => outline,
): RegionRaster {
	const cell = Math.max(20, Math.ceil(Math.sqrt((box.width * box.height) / mostCells)));
	const columns = Math.ceil(box.width / cell);
	const rows = Math.ceil(box.height / cell);
	const owner = new Int32Array(columns * rows).fill(paper);
	const spans = new Int32Array(4 * regions.length);
	const raster = { cell, columns, rows, x: box.x, y: box.y, owner, spans };
	regions.forEach((rings, region) => paintRegion(raster, region, arcs, rings));
	// edges last, so that they are whole where both run through one cell
	for (const border of [outline, edge] as const) {
		for (let arc = 0; arc + 1 < arcs.arcStarts.length; arc++) {
			if (bounds(arc) === border) markOutline(raster, arcs, arc, border);
		}
	}
	return raster;
}

/** Where the outlines cross the middle of each row, by row. */
function crossings(
	raster: RegionRaster,
	arcs: SheetArcs,
	rings: Int32Array[],
): Map<number, number[]> {
	const { cell, rows, x, y } = raster;
	const byRow = new Map<number, number[]>();
	for (const ring of rings) {
		const points = ringPoints(arcs, ring);
		for (let i = 0, j = points.length - 2; i < points.length; j = i, i += 2) {
			const [x0, y0, x1, y1] = [points[j] - x, points[j + 1] - y, points[i] - x, points[i + 1] - y];
			if (y0 === y1) continue;
			const first = Math.max(0, Math.ceil(Math.min(y0, y1) / cell - 0.5));
			const last = Math.min(rows - 1, Math.ceil(Math.max(y0, y1) / cell - 0.5) - 1);
			for (let row = first; row <= last; row++) {
				const at = x0 + ((x1 - x0) * ((row + 0.5) * cell - y0)) / (y1 - y0);
				const list = byRow.get(row);
				if (list) list.push(at);
				else byRow.set(row, [at]);
			}
		}
	}
	return byRow;
}

function paintRegion(
	raster: RegionRaster,
	region: number,
	arcs: SheetArcs,
	rings: Int32Array[],
): void {
	const { cell, columns, owner, spans } = raster;
	let [left, right, top, bottom] = [columns, -1, raster.rows, -1];
	for (const [row, at] of crossings(raster, arcs, rings)) {
		at.sort((a, b) => a - b);
		for (let i = 0; i + 1 < at.length; i += 2) {
			const from = Math.max(0, Math.ceil(at[i] / cell - 0.5));
			const to = Math.min(columns - 1, Math.ceil(at[i + 1] / cell - 0.5) - 1);
			if (to < from) continue;
			owner.fill(region, row * columns + from, row * columns + to + 1);
			[left, right] = [Math.min(left, from), Math.max(right, to)];
			[top, bottom] = [Math.min(top, row), Math.max(bottom, row)];
		}
	}
	spans.set([left, right, top, bottom], 4 * region);
}

/** Index of the cell at a place, -1 off the grid. */
export function cellAt(
	{ cell, columns, rows, x, y }: RegionRaster,
	px: number,
	py: number,
): number {
	const [column, row] = [Math.floor((px - x) / cell), Math.floor((py - y) / cell)];
	return column >= 0 && row >= 0 && column < columns && row < rows ? row * columns + column : -1;
}

/** Marks every cell an arc passes through, in steps of half a cell. */
function markOutline(
	raster: RegionRaster,
	{ arcPoints, arcStarts }: SheetArcs,
	arc: number,
	border: number,
): void {
	const { cell, owner } = raster;
	for (let i = 2 * arcStarts[arc]; i < 2 * arcStarts[arc + 1] - 2; i += 2) {
		const [x, y] = [arcPoints[i], arcPoints[i + 1]];
		const [dx, dy] = [arcPoints[i + 2] - x, arcPoints[i + 3] - y];
		const steps = Math.max(1, Math.ceil((2 * Math.max(Math.abs(dx), Math.abs(dy))) / cell));
		for (let step = 0; step <= steps; step++) {
			const at = cellAt(raster, x + (dx * step) / steps, y + (dy * step) / steps);
			if (at >= 0) owner[at] = border;
		}
	}
}

/** First and last column and row that a box touches; may lie off the grid. */
export function cellsOf({ cell, x, y }: RegionRaster, box: Box): [number, number, number, number] {
	return [
		Math.floor((box.x - x) / cell),
		Math.ceil((box.x + box.width - x) / cell) - 1,
		Math.floor((box.y - y) / cell),
		Math.ceil((box.y + box.height - y) / cell) - 1,
	];
}
