import type { Grid } from './grid.ts';
import { findHeading } from './heading/find-heading.ts';
import { headingNames } from './heading/heading-names.ts';
import { counted, note } from './note.ts';
import type { ReadOptions } from './options.ts';
import { TableRefusal } from './refusal.ts';
import type { Cell, RawTable, TableNote } from './table.ts';
import { notesOnLongRows } from './text/row-notes.ts';

/** Rows become columns under their headings. Refuses a table without a row of data. */
export function toTable(
	grid: Grid,
	sheet: string | null,
	options: ReadOptions,
): { table: RawTable; notes: TableNote[] } {
	if (!grid.rows.length) throw new TableRefusal('no-rows', `${where(sheet)} holds nothing.`);
	const heading = findHeading(grid, options);
	const firstData = heading.first + heading.rows;
	const rows = grid.rows.length - firstData;
	if (rows < 1) {
		throw new TableRefusal('no-rows', `${where(sheet)} has a heading but no rows below it.`);
	}
	const columns = widest(grid, heading.first);
	const { names, notes } = headingNames(grid, heading, columns);
	const headingWidth = Math.max(
		0,
		...grid.rows.slice(heading.first, firstData).map((r) => r.length),
	);
	if (heading.rows) notes.push(...notesOnLongRows(grid, firstData, headingWidth));
	notes.push(...notesOnTallCells(grid, grid.fileRows[firstData]));
	return {
		table: {
			sheet,
			headings: names,
			cells: toColumns(grid.rows, firstData, columns),
			rows,
			headingRow: heading.rows ? grid.fileRows[heading.first] : 0,
			firstRow: grid.fileRows[firstData],
			fileRows: grid.fileRows.slice(firstData),
			percent: Array.from({ length: columns }, (_, c) => isPercent(grid, c)),
		},
		notes,
	};
}

const where = (sheet: string | null) => (sheet === null ? 'The file' : `The sheet "${sheet}"`);

function widest(grid: Grid, from: number): number {
	let columns = 0;
	for (let i = from; i < grid.rows.length; i++) columns = Math.max(columns, grid.rows[i].length);
	return columns;
}

function toColumns(rows: Cell[][], from: number, columns: number): Cell[][] {
	return Array.from({ length: columns }, (_, c) => {
		const column = new Array<Cell>(rows.length - from);
		for (let i = from; i < rows.length; i++) column[i - from] = rows[i][c] ?? null;
		return column;
	});
}

const isPercent = ({ percentCells, numberCells }: Grid, column: number): boolean =>
	(percentCells[column] ?? 0) * 2 > (numberCells[column] ?? 0);

/** Tells cells of a workbook that are merged over several rows of data, since all but one are empty. */
function notesOnTallCells({ merges }: Grid, firstRow: number): TableNote[] {
	const tall = merges.filter(({ top, bottom }) => bottom > top && bottom + 1 > firstRow);
	if (!tall.length) return [];
	const row = Math.min(...tall.map(({ top }) => top + 1));
	const message = `${counted(tall.length, 'merged cell reaches', 'merged cells reach')} over several rows, the first from row ${row} on; only the top row of each has the text.`;
	return [note('warning', 'rows-merged', message, { row })];
}
