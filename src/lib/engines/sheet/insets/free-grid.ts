/**
 * Where on the map's box nothing is drawn. In: the regions on the paper. Out: a coarse grid that answers
 * at once whether a box is free (sums over rectangles, Crow 1984); a cell that anything touches is taken.
 */
import { paper, rasterise } from '../labels/region-raster.ts';
import type { Box } from '../plane/fit.ts';
import type { SheetArcs } from '../plane/quantise.ts';

export interface FreeGrid {
	box: Box;
	/** side of a cell, hundredths of a millimetre */
	cell: number;
	columns: number;
	rows: number;
	/** taken cells above and left of each corner, (columns + 1) a row */
	sums: Uint32Array;
}

const cellsAcross = 160;

export function freeGrid(arcs: SheetArcs, rings: Int32Array[][], box: Box): FreeGrid {
	const cell = Math.max(20, Math.ceil(Math.max(box.width, box.height) / cellsAcross));
	const [columns, rows] = [Math.ceil(box.width / cell), Math.ceil(box.height / cell)];
	const takenCells = new Uint8Array(columns * rows);
	const raster = rasterise(arcs, rings, box);
	raster.owner.forEach((owner, i) => {
		if (owner === paper) return;
		const column = Math.floor(((i % raster.columns) * raster.cell) / cell);
		const row = Math.floor((Math.floor(i / raster.columns) * raster.cell) / cell);
		if (column < columns && row < rows) takenCells[row * columns + column] = 1;
	});
	return { box, cell, columns, rows, sums: summed(takenCells, columns, rows) };
}

function summed(takenCells: Uint8Array, columns: number, rows: number): Uint32Array {
	const sums = new Uint32Array((columns + 1) * (rows + 1));
	for (let row = 0; row < rows; row++) {
		for (let column = 0; column < columns; column++) {
			const at = (row + 1) * (columns + 1) + column + 1;
			sums[at] =
				takenCells[row * columns + column] +
				sums[at - 1] +
				sums[at - columns - 1] -
				sums[at - columns - 2];
		}
	}
	return sums;
}

/** Whether a box lies on the grid and touches no taken cell. */
export function isFree({ box, cell, columns, rows, sums }: FreeGrid, asked: Box): boolean {
	const left = Math.floor((asked.x - box.x) / cell);
	const top = Math.floor((asked.y - box.y) / cell);
	const right = Math.ceil((asked.x + asked.width - box.x) / cell);
	const bottom = Math.ceil((asked.y + asked.height - box.y) / cell);
	if (asked.x < box.x - 1 || asked.y < box.y - 1) return false;
	if (asked.x + asked.width > box.x + box.width + 1) return false;
	if (asked.y + asked.height > box.y + box.height + 1) return false;
	const [l, t] = [Math.max(0, left), Math.max(0, top)];
	const [r, b] = [Math.min(columns, right), Math.min(rows, bottom)];
	const sum = (row: number, column: number) => sums[row * (columns + 1) + column];
	return sum(b, r) - sum(t, r) - sum(b, l) + sum(t, l) === 0;
}
