import type { TableOptions } from '../../schemas/measure-review.ts';
import type { Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { JoinInput } from '../jobs/measure-join.ts';
import type { StoredSource } from '../jobs/measures.work.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { findMeasureTable, type MeasureTableRow } from '../repositories/measures.repository.ts';
import { holdSheet, type SheetRecord } from '../repositories/sheets.repository.ts';
import { boundaryView, type BoundaryView } from './boundary-view.ts';
import { keptDigest, optionsOf } from './measure-options.ts';
import { Conflict, NotFound } from './outcomes.ts';

/** A table of a sheet, or `NotFound`; one that was dropped is gone. */
export async function tableOf(db: Db, sheet: SheetRecord, table: number): Promise<MeasureTableRow> {
	const known = Number.isSafeInteger(table) && table > 0 && table < 2 ** 31;
	const row = known ? await findMeasureTable(db, sheet.id, table) : undefined;
	if (!row || row.state === 'dropped') throw new NotFound('table');
	return row;
}

/** The sheet and one of its tables, held against every other change until the transaction ends. */
export async function holdTable(
	trx: Db,
	member: Member,
	number: number,
	table: number,
): Promise<{ sheet: SheetRecord; row: MeasureTableRow }> {
	const known = Number.isSafeInteger(number) && number > 0 && number < 2 ** 31;
	const sheet = known ? await holdSheet(trx, member.team.id, number) : undefined;
	if (!sheet) throw new NotFound('sheet');
	return { sheet, row: await tableOf(trx, sheet, table) };
}

export const isStale = (sheet: SheetRecord, row: MeasureTableRow): boolean =>
	row.boundary_set_id !== sheet.boundary_set_id;

export function requireOpen({ state }: MeasureTableRow): void {
	if (state !== 'open') {
		throw new Conflict(
			'not-open',
			'The table has been taken over; it is not under review any more.',
		);
	}
}

export function requireFresh(sheet: SheetRecord, row: MeasureTableRow): void {
	if (!isStale(sheet, row)) return;
	throw new Conflict(
		'stale',
		'The boundaries of the sheet have been replaced since this table was joined. Join it to the present regions first.',
	);
}

/** Runs work with the packed table of a row at hand on this machine. */
export async function withKept<T>(
	shop: Pick<Workshop, 'files'>,
	row: MeasureTableRow,
	view: BoundaryView,
	work: (input: JoinInput) => Promise<T>,
): Promise<T> {
	const digest = keptDigest(row);
	const file = await shop.files.local(digest);
	try {
		const { keys, names } = view;
		const source = row.source as unknown as StoredSource;
		const options: TableOptions = optionsOf(row);
		return await work({
			kept: { path: file.path, digest },
			...{ source: { decimal: source.decimal }, options, regions: { keys, names } },
		});
	} finally {
		await file.release();
	}
}

/** The regions that a table is joined to. */
export const regionsOf = (db: Db, row: MeasureTableRow): Promise<BoundaryView> =>
	boundaryView(db, row.boundary_set_id);
