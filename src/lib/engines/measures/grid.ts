import type { TableLimits } from './options.ts';
import { TableRefusal } from './refusal.ts';
import type { Cell } from './table.ts';

/** Cells that were made one in a workbook: rows and columns of the file, from 0, both ends inclusive. */
export interface Merge {
	top: number;
	left: number;
	bottom: number;
	right: number;
}

/** The rows of a file or sheet that are not blank, before it is known which is the heading. */
export interface Grid {
	rows: Cell[][];
	/** number of each row in the file, from 1 */
	fileRows: number[];
	/** cells of the longest row */
	columns: number;
	merges: Merge[];
	/** by column: cells shown as percents, cells with a number */
	percentCells: number[];
	numberCells: number[];
}

export const emptyGrid = (): Grid => ({
	rows: [],
	fileRows: [],
	columns: 0,
	merges: [],
	percentCells: [],
	numberCells: [],
});

/** Takes in one row, without the empty cells at its end; refuses as soon as the table is too large. */
export function addRow(grid: Grid, row: Cell[], fileRow: number, limits: TableLimits): void {
	let length = row.length;
	while (length > 0 && row[length - 1] === null) length--;
	if (length === 0) return;
	row.length = length;
	if (length > limits.columns) {
		const message = `Row ${fileRow} has ${length} columns; at most ${limits.columns} are taken.`;
		throw new TableRefusal('too-many-columns', message);
	}
	// one row is the heading, and a few may be titles
	if (grid.rows.length > limits.rows) {
		const message = `The table has more than ${limits.rows} rows, which is the most that is taken.`;
		throw new TableRefusal('too-many-rows', message);
	}
	grid.rows.push(row);
	grid.fileRows.push(fileRow);
	grid.columns = Math.max(grid.columns, length);
	if (grid.rows.length * grid.columns > limits.cells) {
		const message = `The table has more than ${limits.cells} cells (rows times columns), which is the most that is taken. Leave out columns that are not needed.`;
		throw new TableRefusal('too-many-cells', message);
	}
}

/** A text as a cell: blank ones count as empty, others are kept as they are. */
export const textCell = (text: string): string | null => (text.trim() === '' ? null : text);
