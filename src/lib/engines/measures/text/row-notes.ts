import type { Grid } from '../grid.ts';
import { counted, listed, note } from '../note.ts';
import type { TableNote } from '../table.ts';

/** Rows of the file (from 1) that were not as they should be. */
export interface RowTally {
	/** a quotation mark opened there is never closed */
	openQuote: number | null;
	/** text follows a closing quotation mark */
	strayQuotes: number[];
	/** the first with letters that could not be decoded */
	replaced: number | null;
}

/** What to tell about the rows of a text. */
export function notesOnRows(tally: RowTally): TableNote[] {
	const notes: TableNote[] = [];
	const { openQuote, strayQuotes, replaced } = tally;
	if (openQuote !== null) {
		const message = `A quotation mark opened in row ${openQuote} is never closed; everything after it was read as one cell.`;
		notes.push(note('error', 'quote-open', message, { row: openQuote }));
	}
	if (strayQuotes.length) {
		const message = `Text follows a closing quotation mark in ${strayQuotes.length === 1 ? 'row' : 'rows'} ${listed(strayQuotes)}; check ${strayQuotes.length === 1 ? 'it' : 'them'}.`;
		notes.push(note('warning', 'quote-stray', message, { row: strayQuotes[0] }));
	}
	if (replaced !== null) {
		const message = `Row ${replaced} holds letters that cannot be read in this encoding.`;
		notes.push(note('warning', 'letters-lost', message, { row: replaced }));
	}
	return notes;
}

/** Tells rows with more cells than the heading has, because something is probably not quoted. */
export function notesOnLongRows(grid: Grid, firstData: number, width: number): TableNote[] {
	const long: number[] = [];
	for (let i = firstData; i < grid.rows.length; i++) {
		if (grid.rows[i].length > width) long.push(grid.fileRows[i]);
	}
	if (!long.length) return [];
	const message = `${counted(long.length, 'row has', 'rows have')} more cells than there are headings (${listed(long)}). Perhaps a text holds the sign that parts cells.`;
	return [note('warning', 'rows-long', message, { row: long[0] })];
}
