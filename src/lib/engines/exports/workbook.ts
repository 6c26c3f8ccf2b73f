import writeExcelFile, { type Cell, type SheetData } from 'write-excel-file/universal';
import { headingOf, type DataColumn, type DataTable } from './data-table.ts';
import { repeatableZip } from './repeatable-zip.ts';

const widest = 48;

/**
 * Tables as one workbook (Office Open XML, ECMA-376), one worksheet each: headings with their units in a
 * row that stays in sight, numbers as numbers, dates as dates, everything else as text. A text that begins
 * like a formula stays a text cell, so nothing in it is ever run. A number that is not finite is left empty.
 * The same tables give the same bytes. Pure: nothing of Node is used. Throws on a worksheet name that the
 * format forbids (over 31 signs, or one of \ / ? * [ ] :), a programmer's error.
 */
export async function exportWorkbook(tables: readonly DataTable[]): Promise<Uint8Array> {
	const sheets = tables.map((table) => ({
		data: sheetData(table),
		sheet: table.name,
		columns: widths(table).map((width) => ({ width })),
		stickyRowsCount: 1,
	}));
	const blob = await writeExcelFile(sheets).toBlob();
	return repeatableZip(new Uint8Array(await blob.arrayBuffer()));
}

function sheetData({ columns, rows }: DataTable): SheetData {
	const heading = columns.map((column): Cell => ({
		value: headingOf(column),
		type: String,
		fontWeight: 'bold',
	}));
	return [heading, ...rows.map((row) => columns.map((column, at) => cellOf(column, row[at])))];
}

function cellOf({ kind }: DataColumn, value: string | number | null): Cell {
	if (value === null || value === '') return null;
	if (kind === 'number' && typeof value === 'number') {
		return Number.isFinite(value) ? { value, type: Number } : null;
	}
	if (kind === 'date') return dateCell(String(value));
	return { value: String(value), type: String };
}

function dateCell(text: string): Cell {
	const value = new Date(`${text}T00:00:00Z`);
	if (Number.isNaN(value.getTime())) return { value: text, type: String };
	return { value, type: Date, format: 'yyyy-mm-dd' };
}

/** Wide enough for the longest cell, in signs. */
const widths = ({ columns, rows }: DataTable): number[] =>
	columns.map((column, at) => {
		const longest = rows.reduce(
			(most, row) => Math.max(most, String(row[at] ?? '').length),
			headingOf(column).length,
		);
		return Math.min(widest, longest + 2);
	});
