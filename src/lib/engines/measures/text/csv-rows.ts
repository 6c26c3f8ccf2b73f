import { tableLimits } from '../options.ts';
import { TableRefusal } from '../refusal.ts';
import type { TableNote } from '../table.ts';
import { readText } from './read-text.ts';

/** The rows of a text that are not blank, before anything is said of headings. */
export interface CsvRows {
	/** cells as text, null where blank; as long as the row is */
	rows: (string | null)[][];
	/** number of each row in the file, from 1 */
	fileRows: number[];
	notes: TableNote[];
}

/**
 * The rows of a delimited text (RFC 4180 and its relatives), for tables whose columns are known: its
 * encoding, delimiter and line ends are found out as for any other table. Refused with a sentence where
 * it is no such text or too large; nothing is cut off.
 */
export function readCsvRows(bytes: Uint8Array): CsvRows | { refused: string } {
	try {
		if (bytes.length > tableLimits.fileBytes) return { refused: 'The file is too large.' };
		const { grid, notes } = readText(bytes, {}, tableLimits, () => {});
		const rows = grid.rows.map((row) => row.map((cell) => (cell === null ? null : String(cell))));
		return { rows, fileRows: grid.fileRows, notes };
	} catch (error) {
		if (error instanceof TableRefusal) return { refused: error.message };
		throw error;
	}
}
