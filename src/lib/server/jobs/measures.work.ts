import { readFileSync } from 'node:fs';
import { readTable, type TableSource } from '../../engines/measures/index.ts';
import type { TableReading } from '../../schemas/measure-forms.ts';
import { packTable } from './measure-tables.ts';
import type { Task } from './task-port.ts';

export interface ReadInput {
	path: string;
	fileName: string;
	reading: TableReading;
}

/** What is stored with the row of a table. */
export type StoredSource = TableSource & {
	sheet: string | null;
	rows: number;
	/** how many */
	columns: number;
	headingRow: number;
};

export interface ReadTable {
	status: 'read';
	/** the table, packed as it is kept */
	kept: Uint8Array;
	source: StoredSource;
}

/** Reads the bytes of a table and packs what was read. */
export async function readMeasureTable({
	input: { path, reading },
}: Task<ReadInput>): Promise<ReadTable | { status: 'refused'; code: string; message: string }> {
	const result = await readTable(readFileSync(path), reading);
	if (result.status === 'refused') return result;
	const { table, source } = result;
	const { sheet, rows, headingRow } = table;
	const columns = table.headings.length;
	const stored = { ...source, sheet, rows, columns, headingRow };
	return { status: 'read', kept: packTable(table), source: stored };
}

export { nearestRegions, reviewMeasureTable } from './measure-review.work.ts';
export { takeMeasureTable } from './measure-take.work.ts';
