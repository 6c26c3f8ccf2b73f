/** What a cell can hold; dates of a workbook become ISO 8601 text. */
export type Cell = string | number | boolean | null;

/** A table as it was read: columns of cells, in the order of the file. Only plain JSON values. */
export interface RawTable {
	/** name of the sheet within a workbook, null for plain text */
	sheet: string | null;
	/** text of each column's heading, no two alike; unnamed ones are called `Column 3` */
	headings: string[];
	/** cells by column, `cells[column][row]`; null for an empty cell; numbers of a workbook stay numbers */
	cells: Cell[][];
	rows: number;
	/** number of the (first) heading row and of the first row of data in the file, from 1; 0: no heading row */
	headingRow: number;
	firstRow: number;
	/**
	 * number of each row in the file, from 1; blank rows are left out of the table. A row of a text file is
	 * one record, however many lines it takes
	 */
	fileRows: number[];
	/** columns whose numbers a workbook shows as percents (their values are shares: 0.12 for 12 %) */
	percent: boolean[];
}

/** How a file was understood, so that people can see it and say otherwise. */
export interface TableSource {
	format: 'csv' | 'xlsx';
	/** csv: the character between cells */
	delimiter: string | null;
	encoding: string | null;
	/** sign before the decimals of a number written as text */
	decimal: '.' | ',';
	/** every sheet of a workbook, with its rows that are not blank */
	sheets: { name: string; rows: number }[];
	notes: TableNote[];
}

/** Something noted on the way: `row` counts from 1 as in the file, `column` is a heading. */
export interface TableNote {
	code: string;
	severity: 'error' | 'warning' | 'note';
	/** names regions as #12; a message that does so quotes no text of the file */
	message: string;
	row: number | null;
	column: string | null;
	/** regions that the message names */
	regions: number[];
}
