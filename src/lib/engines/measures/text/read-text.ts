import Papa from 'papaparse';
import { addRow, emptyGrid, textCell, type Grid } from '../grid.ts';
import type { Progress, ReadOptions, TableLimits } from '../options.ts';
import { TableRefusal } from '../refusal.ts';
import type { TableNote } from '../table.ts';
import { findDialect, type Dialect } from './dialect.ts';
import { decodedPieces, findEncoding } from './encoding.ts';
import { refuseLongBlanks } from './long-blanks.ts';
import { notesOnRows, type RowTally } from './row-notes.ts';

const sampleCharacters = 256 * 1024;
/** More text after closing quotation marks than this is no slip of the pen. */
const mostStrayQuotes = 10_000;

export interface ReadText {
	grid: Grid;
	delimiter: string;
	encoding: string;
	notes: TableNote[];
}

/**
 * Rows and cells of a text, parsed piece by piece (RFC 4180: quoted cells may hold delimiters, line ends
 * and doubled quotation marks).
 */
export function readText(
	bytes: Uint8Array,
	options: ReadOptions,
	limits: TableLimits,
	progress: Progress,
): ReadText {
	if (options.delimiter !== undefined && !isDelimiter(options.delimiter)) {
		throw new TableRefusal('bad-option', 'Cells must be parted by a single character.');
	}
	const { encoding, notes } = findEncoding(bytes, options.encoding);
	const pieces = decodedPieces(bytes, encoding);
	const first = pieces.next();
	const start = first.done ? '' : first.value.text;
	const dialect = findDialect(start.slice(0, sampleCharacters), options.delimiter);
	const reading = new Reading(dialect, limits);
	reading.push(start);
	for (const { text, read } of pieces) {
		reading.push(text);
		progress(read / bytes.length);
	}
	reading.end();
	return {
		grid: reading.grid,
		delimiter: dialect.delimiter,
		encoding,
		notes: [...notes, ...notesOnRows(reading.tally)],
	};
}

const isDelimiter = (text: string) => text.length === 1 && !Papa.BAD_DELIMITERS.includes(text);

/** Takes in pieces of text and gives out whole rows. */
class Reading {
	readonly grid = emptyGrid();
	readonly tally: RowTally = { openQuote: null, strayQuotes: [], replaced: null };
	private rest = '';
	private fileRow = 0;
	private parser: Papa.Parser;

	constructor(
		private dialect: Dialect,
		private limits: TableLimits,
	) {
		const { delimiter, newline } = dialect;
		this.parser = new Papa.Parser({ delimiter, newline });
	}

	push(piece: string): void {
		this.rest += piece;
		// a line end may be cut in two between this piece and the next
		const cut = this.rest.endsWith('\r') ? this.rest.length - 1 : this.rest.length;
		const used = this.parse(this.rest.slice(0, cut), true);
		this.rest = used.rest + this.rest.slice(cut);
		if (this.rest.length > this.limits.rowCharacters) {
			const message = `Row ${this.fileRow + 1} goes on for more than ${this.limits.rowCharacters} characters; probably a quotation mark is never closed.`;
			throw new TableRefusal('row-too-long', message);
		}
	}

	end(): void {
		this.parse(this.rest, false);
	}

	private parse(text: string, more: boolean): { rest: string } {
		const even = this.dialect.mixedNewlines ? text.replace(/\r\n?/g, '\n') : text;
		refuseLongBlanks(even, this.dialect.newline);
		const parsed = this.parser.parse(even, 0, more) as Papa.ParseResult<string[]>;
		if (parsed.errors.length > mostStrayQuotes) {
			const message = `Text follows closing quotation marks in too many places, from row ${this.fileRow + (parsed.errors[0].row ?? 0) + 1} on.`;
			throw new TableRefusal('quotes-broken', message);
		}
		for (const { code, row = 0 } of parsed.errors) {
			if (code === 'MissingQuotes') this.tally.openQuote = this.fileRow + row + 1;
			if (code === 'InvalidQuotes')
				this.noteStray(this.fileRow + row + 1, row < parsed.data.length);
		}
		for (const row of parsed.data) this.take(row);
		return { rest: even.slice(parsed.meta.cursor) };
	}

	/** Rows not yet whole are parsed again with the next piece, and would be told twice. */
	private noteStray(fileRow: number, whole: boolean): void {
		if (whole && this.tally.strayQuotes.at(-1) !== fileRow) this.tally.strayQuotes.push(fileRow);
	}

	private take(row: string[]): void {
		this.fileRow++;
		if (this.fileRow === 1 && this.dialect.namesDelimiter) return;
		if (this.tally.replaced === null && row.some((cell) => cell.includes('\ufffd'))) {
			this.tally.replaced = this.fileRow;
		}
		addRow(this.grid, row.map(textCell), this.fileRow, this.limits);
	}
}
