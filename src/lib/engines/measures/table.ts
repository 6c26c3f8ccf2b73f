/** A table as it was read: columns of text, in the order of the file. */
export interface RawTable {
	/** name of the sheet within a workbook, null for plain text */
	sheet: string | null;
	/** text of each column's heading; unnamed ones are called `Column 3` */
	headings: string[];
	/** cells by column, `cells[column][row]`; null for an empty cell; numbers of a workbook stay numbers */
	cells: (string | number | boolean | null)[][];
	rows: number;
	/** number of the heading's row and of the first row of data in the file, from 1 */
	headingRow: number;
	firstRow: number;
}

/** How a file was understood, so that people can see it and say otherwise. */
export interface TableSource {
	format: 'csv' | 'xlsx';
	/** csv: the character between cells */
	delimiter: string | null;
	encoding: string | null;
	/** sign before the decimals of a number written as text */
	decimal: '.' | ',';
	/** every sheet of a workbook, with its rows */
	sheets: { name: string; rows: number }[];
	notes: TableNote[];
}

/** Something noted on the way: `row` counts from 1 as in the file, `column` is a heading. */
export interface TableNote {
	code: string;
	severity: 'error' | 'warning' | 'note';
	message: string;
	row: number | null;
	column: string | null;
}
