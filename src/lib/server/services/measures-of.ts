import type { DeskMeasure, DeskTextColumn } from '../../schemas/desk-territories.ts';
import type { Standing } from '../jobs/measure-outcome.ts';
import type { Db } from '../database/connection.ts';
import {
	readMeasures,
	type MeasureRow,
	type MeasureTableRow,
} from '../repositories/measures.repository.ts';

export interface MeasureColumns {
	measures: DeskMeasure[];
	textColumns: DeskTextColumn[];
}

/**
 * The figures and words that have been taken over for a sheet, one entry a region of its boundary set.
 * What was joined to an earlier set is stale: its entries are in that set's order and it says so.
 */
export async function measuresOf(db: Db, sheetId: string): Promise<MeasureColumns> {
	const sheet = await db
		.selectFrom('sheets')
		.select('boundary_set_id')
		.where('id', '=', sheetId)
		.executeTakeFirst();
	const rows = await readMeasures(db, sheetId);
	return {
		measures: rows.flatMap((row) =>
			row.values ? measure(row, row.values, sheet?.boundary_set_id) : [],
		),
		textColumns: rows.flatMap(({ id, name, table_name: table, texts, boundary_set_id }) =>
			texts ? { id, name, table, texts, stale: boundary_set_id !== sheet?.boundary_set_id } : [],
		),
	};
}

function measure(row: MeasureRow, values: (number | null)[], present?: string): DeskMeasure {
	return {
		id: row.id,
		name: row.name,
		unit: row.unit,
		table: row.table_name,
		confidential: row.confidential,
		values,
		missing: values.reduce((missing: number, value) => missing + Number(value === null), 0),
		total: values.reduce((total: number, value) => total + (value ?? 0), 0),
		stale: row.boundary_set_id !== present,
	};
}

/** What a table would be held against when it is taken over: what is joined to the same boundaries. */
export const standingOf = (rows: MeasureRow[], table: MeasureTableRow): Standing[] =>
	rows.map((row) => ({
		...{ id: row.id, name: row.name, unit: row.unit, kind: row.kind },
		confidential: row.confidential,
		comparable: row.boundary_set_id === table.boundary_set_id,
		...{ values: row.values, texts: row.texts },
	}));
