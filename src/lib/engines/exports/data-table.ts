import { csvField } from '../measures/text/csv-field.ts';

/** A table on its way out: typed columns, then rows with one cell a column. */
export interface DataTable {
	/** name of the worksheet */
	name: string;
	columns: DataColumn[];
	rows: (string | number | null)[][];
}

export interface DataColumn {
	heading: string;
	/** shown in the heading: `visits (hours a year)` */
	unit?: string;
	/** a date is written YYYY-MM-DD */
	kind: 'text' | 'number' | 'date';
}

export const headingOf = ({ heading, unit }: Pick<DataColumn, 'heading' | 'unit'>): string =>
	unit ? `${heading} (${unit})` : heading;

/**
 * The table as text: RFC 4180, UTF-8, headings first, numbers with a point and no grouping, texts that a
 * spreadsheet would run as a formula led by an apostrophe. `byteOrderMark` helps spreadsheets that would
 * otherwise misread accents. Byte for byte repeatable.
 */
export function exportTableCsv(
	{ columns, rows }: DataTable,
	options: { byteOrderMark?: boolean } = {},
): Uint8Array {
	const lines = [columns.map(headingOf), ...rows];
	const text = lines.map((line) => `${line.map(csvField).join(',')}\r\n`).join('');
	return new TextEncoder().encode(options.byteOrderMark ? `\ufeff${text}` : text);
}
