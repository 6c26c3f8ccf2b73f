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
export const taken = -2;
export const outline = -3;

export interface RegionRaster {
	/** side of a cell, hundredths of a millimetre */
	cell: number;
	columns: number;
	rows: number;
	/** upper left corner */
	x: number;
	y: number;
	/** region number, `paper`, `taken` or `outline`, row by row */
	owner: Int32Array;
	/** columns and rows each region spans: left, right, top, bottom; right and bottom included */
	spans: Int32Array;
}

/** Most cells in a grid: 4 bytes each, a few milliseconds to read through. */
const mostCells = 2_000_000;

/**
 * In: the rings of every region, and of all arcs those that bound one. Rings of several regions given
 * as one region melt together, for their common borders cancel.
 */
export function rasterise(
	arcs: SheetArcs,
	regions: Int32Array[][],
	box: Box,
	bounds: (arc: number) => boolean = () => true,
): RegionRaster {
	const cell = Math.max(20, Math.ceil(Math.sqrt((box.width * box.height) / mostCells)));
	const columns = Math.ceil(box.width / cell);
	const rows = Math.ceil(box.height / cell);
	const owner = new Int32Array(columns * rows).fill(paper);
	const spans = new Int32Array(4 * regions.length);
	const raster = { cell, columns, rows, x: box.x, y: box.y, owner, spans };
	regions.forEach((rings, region) => paintRegion(raster, region, arcs, rings));
	for (let arc = 0; arc + 1 < arcs.arcStarts.length; arc++) {
		if (bounds(arc)) markOutline(raster, arcs, arc);
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

/** Marks every cell an arc passes through, in steps of half a cell. */
function markOutline(raster: RegionRaster, { arcPoints, arcStarts }: SheetArcs, arc: number): void {
	const { cell, columns, rows, owner } = raster;
	for (let point = arcStarts[arc] + 1; point < arcStarts[arc + 1]; point++) {
		const [x, y] = [arcPoints[2 * point] - raster.x, arcPoints[2 * point + 1] - raster.y];
		const dx = arcPoints[2 * point - 2] - raster.x - x;
		const dy = arcPoints[2 * point - 1] - raster.y - y;
		const steps = Math.ceil((2 * Math.max(Math.abs(dx), Math.abs(dy))) / cell);
		for (let step = 0; step <= steps; step++) {
			const column = Math.floor((x + (dx * step) / steps) / cell);
			const row = Math.floor((y + (dy * step) / steps) / cell);
			if (column >= 0 && row >= 0 && column < columns && row < rows) {
				owner[row * columns + column] = outline;
			}
		}
	}
}

/** Whether every cell a box touches has this owner. */
export function allOwnedBy(raster: RegionRaster, box: Box, wanted: number): boolean {
	const { cell, columns, rows, owner } = raster;
	const left = Math.floor((box.x - raster.x) / cell);
	const right = Math.ceil((box.x + box.width - raster.x) / cell) - 1;
	const top = Math.floor((box.y - raster.y) / cell);
	const bottom = Math.ceil((box.y + box.height - raster.y) / cell) - 1;
	if (left < 0 || top < 0 || right >= columns || bottom >= rows) return false;
	for (let row = top; row <= bottom; row++) {
		for (let i = row * columns + left; i <= row * columns + right; i++) {
			if (owner[i] !== wanted) return false;
		}
	}
	return true;
}

/** Marks the cells a box touches, so that no other text is put there. */
export function take(raster: RegionRaster, box: Box): void {
	const { cell, columns, rows, owner } = raster;
	const left = Math.max(0, Math.floor((box.x - raster.x) / cell));
	const right = Math.min(columns, Math.ceil((box.x + box.width - raster.x) / cell));
	const bottom = Math.min(rows, Math.ceil((box.y + box.height - raster.y) / cell));
	for (let row = Math.max(0, Math.floor((box.y - raster.y) / cell)); row < bottom; row++) {
		owner.fill(taken, row * columns + left, row * columns + right);
	}
}
