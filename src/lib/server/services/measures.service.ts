import type { MeasureTableNote } from '../../schemas/desk-territories.ts';
import type { DeskSheet } from '../../schemas/desk.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	countOpenTables,
	listMeasures,
	listMeasureTables,
	type MeasureTableRow,
} from '../repositories/measures.repository.ts';
import type { SheetRecord } from '../repositories/sheets.repository.ts';
import { sheetOf } from './draft.service.ts';
import { measuresOf, type MeasureColumns } from './measures-of.ts';
import { personName } from './people.ts';

/** The figures of a sheet with their values, for whoever may see them. */
export async function deskMeasures(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<MeasureColumns> {
	requireAccess(member, 'measures.read');
	const sheet = await sheetOf(shop.db, member, number);
	return measuresOf(shop.db, sheet.id);
}

/** Every table of a sheet that was not dropped, the newest first, with the measures it still holds. */
export async function measureTables(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	number: number,
): Promise<MeasureTableNote[]> {
	requireAccess(member, 'measures.read');
	const sheet = await sheetOf(shop.db, member, number);
	const measures = await listMeasures(shop.db, sheet.id);
	const tables = await listMeasureTables(shop.db, sheet.id);
	return tables
		.filter(({ state }) => state !== 'dropped')
		.map((table) =>
			noteOf(
				table,
				measures.filter(({ table_id }) => table_id === table.id),
				sheet,
			),
		);
}

/** A table in the list, with the measures that are left of it. */
export const noteOf = (
	table: MeasureTableRow,
	measures: Awaited<ReturnType<typeof listMeasures>>,
	sheet: SheetRecord,
): MeasureTableNote => ({
	number: table.number,
	name: table.name,
	fileName: table.file_name,
	state: table.state,
	rows: table.row_count,
	matched: table.matched_count,
	confidential: table.confidential,
	createdAt: table.created_at.toISOString(),
	createdBy: personName(table),
	takenAt: table.taken_at?.toISOString() ?? null,
	takenBy: personName({ by_name: table.taker_name, by_email: table.taker_email }),
	measures: measures.map(({ id, name, unit, kind }) => ({ id, name, unit, kind })),
	stale: table.boundary_set_id !== sheet.boundary_set_id,
});

/** What the docket says of them. */
export async function measureSummary(db: Db, sheet: SheetRecord): Promise<DeskSheet['measures']> {
	const measures = await listMeasures(db, sheet.id);
	const figures = measures.filter(({ kind }) => kind === 'number');
	return {
		count: figures.length,
		missing: figures.reduce((sum, { missing }) => sum + missing, 0),
		stale: measures.filter((one) => one.boundary_set_id !== sheet.boundary_set_id).length,
		open: await countOpenTables(db, sheet.id),
	};
}
