import { detectFormat } from './detect-format.ts';
import { counted } from './note.ts';
import { guessDecimal } from './numbers/guess-decimal.ts';
import { tableLimits, type Progress, type ReadOptions } from './options.ts';
import { TableRefusal, type TableRefusalCode } from './refusal.ts';
import type { RawTable, TableSource } from './table.ts';
import { readText } from './text/read-text.ts';
import { toTable } from './to-table.ts';
import { readWorkbook } from './workbook/read-workbook.ts';

export type ReadResult =
	| { status: 'read'; table: RawTable; source: TableSource }
	| { status: 'refused'; code: TableRefusalCode; message: string };

/**
 * A table from the bytes of a file: CSV (RFC 4180 and its relatives) or a workbook (ECMA-376).
 *
 * In: the whole file; what a person said about it (`ReadOptions`), all else is found out and told in
 * `source`; `progress` is called with the share done, 0 to 1. Out: columns of cells as they stand in the
 * file, none evaluated, formulas by the value they were saved with; or a code and a sentence why the file
 * is refused. Nothing is cut off: a table over a limit is refused. Throws only for programmer's errors.
 * Time and memory: linear in the size of the file.
 */
export async function readTable(
	bytes: Uint8Array,
	options: ReadOptions = {},
	progress: Progress = () => {},
): Promise<ReadResult> {
	try {
		const limits = { ...tableLimits, ...options.limits };
		if (bytes.length > limits.fileBytes) {
			const message = `The file has ${counted(bytes.length, 'byte')}; at most ${limits.fileBytes} are taken.`;
			throw new TableRefusal('file-too-large', message);
		}
		const read = detectFormat(bytes) === 'xlsx' ? workbook : text;
		return { status: 'read', ...read(bytes, options, limits, progress) };
	} catch (error) {
		if (!(error instanceof TableRefusal)) throw error;
		return { status: 'refused', code: error.code, message: error.message };
	}
}

type Reader = (
	bytes: Uint8Array,
	options: ReadOptions,
	limits: typeof tableLimits,
	progress: Progress,
) => { table: RawTable; source: TableSource };

const text: Reader = (bytes, options, limits, progress) => {
	const { grid, delimiter, encoding, notes } = readText(bytes, options, limits, progress);
	const made = toTable(grid, null, options);
	const { decimal, more } = decimalOf(made.table, delimiter, options);
	return {
		table: made.table,
		source: {
			format: 'csv',
			delimiter,
			encoding,
			decimal,
			sheets: [],
			notes: [...notes, ...made.notes, ...more],
		},
	};
};

const workbook: Reader = (bytes, options, limits, progress) => {
	const { grid, sheet, sheets, notes } = readWorkbook(bytes, options, limits, progress);
	const made = toTable(grid, sheet, options);
	const { decimal, more } = decimalOf(made.table, null, options);
	return {
		table: made.table,
		source: {
			format: 'xlsx',
			delimiter: null,
			encoding: null,
			decimal,
			sheets,
			notes: [...notes, ...made.notes, ...more],
		},
	};
};

function decimalOf(table: RawTable, delimiter: string | null, { decimal }: ReadOptions) {
	if (decimal) return { decimal, more: [] };
	const guessed = guessDecimal(table.cells, delimiter);
	return { decimal: guessed.decimal, more: guessed.notes };
}
