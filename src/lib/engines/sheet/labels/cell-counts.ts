/**
 * Counts of cells that say at once where a region cannot fill enough of a box, so that the cells of the
 * box need not be gone through. Source of the method: summed-area tables, Crow 1984.
 */
import { outline, type RegionRaster } from './region-raster.ts';

export interface CellCounts {
	/** cells of every region */
	own: Uint32Array;
	/** (columns + 1) * (rows + 1): cells above and to the left that are no outline */
	open: Uint32Array;
}

export function countCells({ owner, spans, columns, rows }: RegionRaster): CellCounts {
	const own = new Uint32Array(spans.length / 4);
	const open = new Uint32Array((columns + 1) * (rows + 1));
	for (let row = 0, i = 0; row < rows; row++) {
		let inRow = 0;
		for (let column = 0; column < columns; column++, i++) {
			const at = owner[i];
			if (at >= 0) own[at]++;
			if (at !== outline) inRow++;
			const under = (row + 1) * (columns + 1) + column + 1;
			open[under] = open[under - columns - 1] + inRow;
		}
	}
	return { own, open };
}

/**
 * The most that a region can have of the cells of a box that are no outline: never less than its true
 * share. In: the box's first and last column and row, within the grid.
 */
export function mostShare(
	{ own, open }: CellCounts,
	columns: number,
	region: number,
	[left, right, top, bottom]: readonly [number, number, number, number],
): number {
	const wide = columns + 1;
	const [above, below] = [top * wide, (bottom + 1) * wide];
	const all =
		open[below + right + 1] - open[below + left] - open[above + right + 1] + open[above + left];
	return all ? own[region] / all : 0;
}
