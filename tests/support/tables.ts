import {
	readTable,
	type RawTable,
	type ReadOptions,
	type TableSource,
} from '../../src/lib/engines/measures/index.ts';

export const utf8 = (text: string): Uint8Array => new TextEncoder().encode(text);

/** Reads what must be readable. */
export async function read(
	file: string | Uint8Array,
	options: ReadOptions = {},
): Promise<{ table: RawTable; source: TableSource }> {
	const result = await readTable(typeof file === 'string' ? utf8(file) : file, options);
	if (result.status !== 'read') throw new Error(`${result.code}: ${result.message}`);
	return result;
}

/** The code by which what must not be readable is refused; the sentence must be one. */
export async function refusal(
	file: string | Uint8Array,
	options: ReadOptions = {},
): Promise<string> {
	const result = await readTable(typeof file === 'string' ? utf8(file) : file, options);
	if (result.status !== 'refused') throw new Error('It was read.');
	if (!/^[A-Z"].*\.$/s.test(result.message)) throw new Error(`No sentence: ${result.message}`);
	return result.code;
}

/** Rows of a table, as they are easier to compare. */
export const rowsOf = (table: RawTable) =>
	Array.from({ length: table.rows }, (_, row) => table.cells.map((column) => column[row]));

export const codes = ({ notes }: Pick<TableSource, 'notes'>): string[] =>
	notes.map(({ code }) => code);
