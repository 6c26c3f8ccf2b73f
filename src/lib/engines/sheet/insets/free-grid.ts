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

const cellsAcross = 140;
/** Side of a cell of a small raster: see `rasterise`. */
const rasterCell = 20;

export function freeGrid(
	{ arcPoints, arcStarts }: SheetArcs,
	rings: Int32Array[][],
	box: Box,
): FreeGrid {
	const cell = Math.max(rasterCell, Math.ceil(Math.max(box.width, box.height) / cellsAcross));
	// the raster's cells are of one size, so the sheet is made smaller for it
	const less = rasterCell / cell;
	const small: SheetArcs = { arcPoints: arcPoints.map((at) => Math.round(at * less)), arcStarts };
	const { x, y, width, height } = box;
	const raster = rasterise(small, rings, {
		...{ x: x * less, y: y * less, width: width * less, height: height * less },
	});
	const { columns, rows } = raster;
	const takenCells = Uint8Array.from(raster.owner, (owner) => (owner === paper ? 0 : 1));
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
