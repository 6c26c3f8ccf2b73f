import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';

/** Makes the next sheet of a team; its number is one more than the last ever given. */
export async function insertSheet(
	trx: Db,
	sheet: { teamId: string; name: string; boundarySetId: string; createdBy: string | null },
): Promise<{ id: string; number: number }> {
	await sql`select 1 from teams where id = ${sheet.teamId} for no key update`.execute(trx);
	return trx
		.insertInto('sheets')
		.values(({ selectFrom }) => ({
			team_id: sheet.teamId,
			name: sheet.name,
			boundary_set_id: sheet.boundarySetId,
			created_by: sheet.createdBy,
			number: selectFrom('sheets')
				.where('team_id', '=', sheet.teamId)
				.select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
		}))
		.returning(['id', 'number'])
		.executeTakeFirstOrThrow();
}

export const findSheet = (db: Db, teamId: string, number: number) =>
	db
		.selectFrom('sheets')
		.selectAll()
		.where('team_id', '=', teamId)
		.where('number', '=', number)
		.executeTakeFirst();

/** The same, held against every other change until the transaction ends. */
export const holdSheet = (trx: Db, teamId: string, number: number) =>
	trx
		.selectFrom('sheets')
		.selectAll()
		.where('team_id', '=', teamId)
		.where('number', '=', number)
		.forUpdate()
		.executeTakeFirst();

export const findSheetById = (db: Db, id: string) =>
	db.selectFrom('sheets').selectAll().where('id', '=', id).executeTakeFirst();

export const listSheets = (db: Db, teamId: string) =>
	db
		.selectFrom('sheets')
		.innerJoin('boundary_sets', 'boundary_sets.id', 'sheets.boundary_set_id')
		.innerJoin('drafts', (join) =>
			join
				.onRef('drafts.sheet_id', '=', 'sheets.id')
				.onRef('drafts.revision', '=', 'sheets.revision'),
		)
		.leftJoin('colourings', 'colourings.id', 'drafts.colouring_id')
		.leftJoin('User', 'User.id', 'drafts.saved_by')
		.select([
			'sheets.number',
			'sheets.name',
			'boundary_sets.region_count',
			'colourings.inks_used',
			'drafts.saved_at',
			'User.name as by_name',
			'User.email as by_email',
		])
		.select(({ selectFrom }) => [
			selectFrom('findings')
				.whereRef('findings.boundary_set_id', '=', 'sheets.boundary_set_id')
				.where('accepted_at', 'is', null)
				.where('severity', '!=', 'note')
				.select(({ fn }) => fn.countAll<number>().as('n'))
				.as('open_findings'),
			selectFrom('editions')
				.whereRef('editions.sheet_id', '=', 'sheets.id')
				.select(({ fn }) => fn.max('editions.number').as('n'))
				.as('last_edition'),
		])
		.where('sheets.team_id', '=', teamId)
		.orderBy('drafts.saved_at', 'desc')
		.execute();

export async function renameSheet(trx: Db, id: string, name: string): Promise<void> {
	await trx
		.updateTable('sheets')
		.set({ name, updated_at: sql`now()` })
		.where('id', '=', id)
		.execute();
}

export async function deleteSheet(trx: Db, id: string): Promise<void> {
	await trx.deleteFrom('sheets').where('id', '=', id).execute();
}

export interface NewColouring {
	inks: ArrayLike<number>;
	inksUsed: number;
	lowerBound: number;
	/** stored as JSON */
	proof: object;
}

export async function insertColouring(
	trx: Db,
	sheetId: string,
	colouring: NewColouring,
): Promise<string> {
	const { id } = await trx
		.insertInto('colourings')
		.values({
			sheet_id: sheetId,
			inks: Array.from(colouring.inks),
			inks_used: colouring.inksUsed,
			lower_bound: colouring.lowerBound,
			proof: JSON.stringify(colouring.proof),
		})
		.returning('id')
		.executeTakeFirstOrThrow();
	return id;
}

/** Inks of the colouring of the present regions that was stored last, whichever draft it was for. */
export const latestInks = async (db: Db, sheetId: string): Promise<number[] | null> => {
	const row = await db
		.selectFrom('colourings')
		.select('inks')
		.where('sheet_id', '=', sheetId)
		.where(({ exists, selectFrom }) =>
			exists(
				selectFrom('drafts')
					.innerJoin('sheets', 'sheets.id', 'drafts.sheet_id')
					.select('drafts.revision')
					.whereRef('drafts.colouring_id', '=', 'colourings.id')
					.whereRef('drafts.boundary_set_id', '=', 'sheets.boundary_set_id'),
			),
		)
		.orderBy('created_at', 'desc')
		.limit(1)
		.executeTakeFirst();
	return row?.inks ?? null;
};

export interface NewDraft {
	sheetId: string;
	revision: number;
	document: unknown;
	colouringId: string | null;
	/** why there is no colouring, when there is none */
	explanation: unknown;
	savedBy: string | null;
}

/** Adds a revision about the sheet's present regions and makes it its current draft. The caller holds the sheet. */
export async function insertDraft(trx: Db, draft: NewDraft): Promise<Date> {
	const { saved_at } = await trx
		.insertInto('drafts')
		.values(({ selectFrom }) => ({
			sheet_id: draft.sheetId,
			boundary_set_id: selectFrom('sheets')
				.where('id', '=', draft.sheetId)
				.select('boundary_set_id'),
			revision: draft.revision,
			document: JSON.stringify(draft.document),
			colouring_id: draft.colouringId,
			explanation: draft.explanation === null ? null : JSON.stringify(draft.explanation),
			saved_by: draft.savedBy,
		}))
		.returning('saved_at')
		.executeTakeFirstOrThrow();
	await trx
		.updateTable('sheets')
		.set({ revision: draft.revision, updated_at: sql`now()` })
		.where('id', '=', draft.sheetId)
		.execute();
	return saved_at;
}

export const findDraft = (db: Db, sheetId: string, revision: number) =>
	db
		.selectFrom('drafts')
		.leftJoin('colourings', 'colourings.id', 'drafts.colouring_id')
		.leftJoin('User', 'User.id', 'drafts.saved_by')
		.selectAll('drafts')
		.select([
			'colourings.inks',
			'colourings.inks_used',
			'colourings.lower_bound',
			'colourings.proof',
			'User.name as by_name',
			'User.email as by_email',
		])
		.where('drafts.sheet_id', '=', sheetId)
		.where('drafts.revision', '=', revision)
		.executeTakeFirst();
export type DraftRow = NonNullable<Awaited<ReturnType<typeof findDraft>>>;
export type SheetRecord = Row<'sheets'>;

/** Every boundary set that a draft of a sheet was ever about. */
export async function setsOfDrafts(db: Db, sheetId: string): Promise<string[]> {
	const rows = await db
		.selectFrom('drafts')
		.select('boundary_set_id')
		.distinct()
		.where('sheet_id', '=', sheetId)
		.execute();
	return rows.map((row) => row.boundary_set_id);
}

/** Gives a sheet other boundaries. The caller holds the sheet, and adds a draft about them. */
export async function giveBoundaries(trx: Db, id: string, setId: string): Promise<void> {
	await trx
		.updateTable('sheets')
		.set({ boundary_set_id: setId, updated_at: sql`now()` })
		.where('id', '=', id)
		.execute();
}
