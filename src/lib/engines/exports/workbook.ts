import writeExcelFile, { type Cell, type SheetData } from 'write-excel-file/universal';
import { headingOf, type DataColumn, type DataTable } from './data-table.ts';
import { repeatableZip } from './repeatable-zip.ts';

const widest = 48;

/**
 * Tables as one workbook (Office Open XML, ECMA-376), one worksheet each: headings with their units in a
 * row that stays in sight, numbers as numbers, dates as dates, everything else as text. A text that begins
 * like a formula stays a text cell, so nothing in it is ever run; signs that XML forbids are
 * left out, and a text over 32,767 signs, the most a cell holds, is cut. A number that is not finite is left empty.
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
	return repeatableZip(new Uint8Array(await blob.arrayBuffer()), withoutGuards);
}

function sheetData({ columns, rows }: DataTable): SheetData {
	const heading = columns.map((column): Cell => ({
		value: fitting(headingOf(column)),
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
	return { value: fitting(String(value)), type: String };
}

/** The most letters a cell holds (ECMA-376 part 1, 18.3.1.4 as the applications limit it). */
const longest = 32_767;
/** Characters that no XML document may have (XML 1.0, 2.2), lone surrogates among them. */
const illegal = /[^\t\n\r\u{20}-\u{d7ff}\u{e000}-\u{fffd}\u{10000}-\u{10ffff}]/gu;

const fitting = (text: string): string => {
	const legal = text.replace(illegal, '');
	const short =
		legal.length > longest ? `${legal.slice(0, longest - 2).replace(illegal, '')}…` : legal;
	return short in {} || short.startsWith(guard) ? guard + short : short;
};

/**
 * The package keeps texts as names of an object's members, so that `constructor` or `__proto__` would be
 * something else: those wear a sign in front of them until the file is made.
 */
const guard = '\ue000';

function withoutGuards(name: string, entry: Uint8Array): Uint8Array {
	if (name !== 'xl/sharedStrings.xml') return entry;
	const text = new TextDecoder().decode(entry).replaceAll(`>${guard}`, '>');
	return new TextEncoder().encode(text);
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
