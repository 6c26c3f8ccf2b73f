/** What a person may say about a file; whatever is absent is found out. */
export interface ReadOptions {
	/** sheet of a workbook, by name */
	sheet?: string;
	/** text: the character between cells */
	delimiter?: string;
	/** text: an encoding by its label in the WHATWG Encoding Standard */
	encoding?: string;
	/** sign before the decimals of a number written as text */
	decimal?: '.' | ',';
	/** number of the heading row in the file, from 1; 0: the table has none */
	headingRow?: number;
	/** whether the heading takes one row or two */
	headingRows?: 1 | 2;
	/** other caps than `tableLimits` */
	limits?: Partial<TableLimits>;
}

export interface TableLimits {
	fileBytes: number;
	rows: number;
	columns: number;
	/** rows times columns */
	cells: number;
	/** all parts of a workbook together, unpacked */
	unpackedBytes: number;
	/** characters of one row of a text file */
	rowCharacters: number;
}

const MiB = 1024 ** 2;

/** What is read at most; beyond it a file is refused, never cut off. 200,000 rows are a normal table. */
export const tableLimits: TableLimits = {
	fileBytes: 256 * MiB,
	rows: 1_000_000,
	columns: 500,
	cells: 20_000_000,
	unpackedBytes: 512 * MiB,
	rowCharacters: MiB,
};

/** How far the reading is, 0 to 1. */
export type Progress = (share: number) => void;
