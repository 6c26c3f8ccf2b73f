import { addRow, emptyGrid, type Grid } from '../grid.ts';
import { findHeading } from '../heading/find-heading.ts';
import { counted, listed, note, quoted } from '../note.ts';
import type { Progress, ReadOptions, TableLimits } from '../options.ts';
import { TableRefusal } from '../refusal.ts';
import type { TableNote, TableSource } from '../table.ts';
import { readContents, type Contents } from './contents.ts';
import { WorkbookPackage } from './package.ts';
import { readSheet, type Lookups } from './read-sheet.ts';
import { readSharedStrings } from './shared-strings.ts';
import { readStyles } from './styles.ts';

export interface ReadSheets {
	grid: Grid;
	sheet: string;
	sheets: TableSource['sheets'];
	notes: TableNote[];
}

interface OneSheet {
	grid: Grid;
	/** rows of the file with a formula that has no value */
	unsaved: number[];
}

/** More merged ranges than this are decoration. */
const mostMerges = 10_000;

/** The wanted sheet, else the first that looks like a table; and how many rows every sheet has. */
export function readWorkbook(
	bytes: Uint8Array,
	options: ReadOptions,
	limits: TableLimits,
	progress: Progress,
): ReadSheets {
	const pack = new WorkbookPackage(bytes, limits);
	const contents = readContents(pack);
	const wanted = wantedSheet(contents, options.sheet);
	const lookups = {
		strings: readSharedStrings(pack, contents.sharedStrings),
		styles: readStyles(pack, contents.styles),
		from1904: contents.from1904,
	};
	let read = 0;
	const onRead = (count: number) => progress(Math.min(1, (read += count) / pack.declaredBytes));
	let chosen: (OneSheet & { name: string; isTable: boolean }) | null = null;
	const sheets = contents.sheets.map(({ name, part }) => {
		const settled = chosen?.isTable || (wanted !== null && wanted !== name);
		if (settled) return { name, rows: countRows(pack, part, lookups, onRead) };
		const one = oneSheet(pack, part, lookups, limits, onRead);
		const isTable = wanted === name || looksLikeTable(one.grid);
		if (isTable || (!chosen && one.grid.rows.length)) chosen = { ...one, name, isTable };
		return { name, rows: one.grid.rows.length };
	});
	const found = chosen as (OneSheet & { name: string }) | null;
	if (!found) throw new TableRefusal('no-rows', 'The workbook holds nothing.');
	return { grid: found.grid, sheet: found.name, sheets, notes: notesOn(found, sheets) };
}

function wantedSheet({ sheets }: Contents, name: string | undefined): string | null {
	if (name === undefined) return null;
	if (sheets.some((sheet) => sheet.name === name)) return name;
	const names = listed(sheets.map((sheet) => quoted(sheet.name)));
	throw new TableRefusal('no-such-sheet', `There is no sheet ${quoted(name)}, only ${names}.`);
}

function oneSheet(
	pack: WorkbookPackage,
	part: string,
	lookups: Lookups,
	limits: TableLimits,
	read: (bytes: number) => void,
): OneSheet {
	const grid = emptyGrid();
	const unsaved: number[] = [];
	readSheet(pack, part, lookups, {
		read,
		row: (cells, fileRow) => addRow(grid, cells, fileRow, limits),
		merge(merge) {
			if (grid.merges.length < mostMerges) grid.merges.push(merge);
		},
		number(column, style) {
			grid.numberCells[column] = (grid.numberCells[column] ?? 0) + 1;
			if (style === 'percent') grid.percentCells[column] = (grid.percentCells[column] ?? 0) + 1;
		},
		unsaved: (fileRow) => unsaved.push(fileRow),
	});
	return { grid, unsaved };
}

function countRows(
	pack: WorkbookPackage,
	part: string,
	lookups: Lookups,
	read: (bytes: number) => void,
): number {
	let rows = 0;
	const nothing = () => {};
	readSheet(pack, part, lookups, {
		read,
		row: () => rows++,
		merge: nothing,
		number: nothing,
		unsaved: nothing,
	});
	return rows;
}

/** Two columns or more, and a row below the heading. */
function looksLikeTable(grid: Grid): boolean {
	if (grid.rows.length < 2 || grid.columns < 2) return false;
	const { first, rows } = findHeading(grid, {});
	return grid.rows.length > first + rows && grid.rows[first].length > 1;
}

function notesOn(
	{ unsaved, name }: OneSheet & { name: string },
	sheets: TableSource['sheets'],
): TableNote[] {
	const notes: TableNote[] = [];
	if (sheets.length > 1) {
		const message = `The workbook has ${sheets.length} sheets; ${quoted(name)} was read.`;
		notes.push(note('note', 'sheet-chosen', message));
	}
	if (unsaved.length) {
		const message = `${counted(unsaved.length, 'formula was', 'formulas were')} saved without a value and read as empty: row ${listed(unsaved)}. Open and save the workbook in a spreadsheet program.`;
		notes.push(note('warning', 'formula-unsaved', message, { row: unsaved[0] }));
	}
	return notes;
}
