import type { Db } from '../database/connection.ts';

/** Figures that follow a sheet to other boundaries, and back. The caller holds the sheet. */

export interface FiguresRow {
	id: string;
	/** the table that they came from */
	table: string;
	values: (number | null)[] | null;
	texts: (string | null)[] | null;
}

/** Writes figures in the order of other regions; what is gone or came from another table since is passed over. */
export async function writeFigures(trx: Db, measures: FiguresRow[]): Promise<void> {
	for (const { id, table, values, texts } of measures) {
		await trx
			.updateTable('measures')
			.set({ values, texts })
			.where('id', '=', id)
			.where('table_id', '=', table)
			.execute();
	}
}

/** Joins the tables that figures came from to a boundary set. */
export async function moveTables(trx: Db, measures: FiguresRow[], setId: string): Promise<void> {
	const tables = [...new Set(measures.map(({ table }) => table))];
	if (tables.length === 0) return;
	await trx
		.updateTable('measure_tables')
		.set({ boundary_set_id: setId })
		.where('id', 'in', tables)
		.execute();
}
