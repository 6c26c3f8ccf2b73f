import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';

export const findTerritoryDraft = (db: Db, sheetId: string, revision: number) =>
	db
		.selectFrom('territory_drafts')
		.leftJoin('User', 'User.id', 'territory_drafts.saved_by')
		.selectAll('territory_drafts')
		.select(['User.name as by_name', 'User.email as by_email'])
		.where('territory_drafts.sheet_id', '=', sheetId)
		.where('territory_drafts.revision', '=', revision)
		.executeTakeFirst();
export type TerritoryDraftRow = NonNullable<Awaited<ReturnType<typeof findTerritoryDraft>>>;

/** The territories of a sheet as they are now; none before anybody saved some. */
export const currentTerritoryDraft = (db: Db, sheetId: string) =>
	db
		.selectFrom('sheets')
		.innerJoin('territory_drafts', (join) =>
			join
				.onRef('territory_drafts.sheet_id', '=', 'sheets.id')
				.onRef('territory_drafts.revision', '=', 'sheets.territory_revision'),
		)
		.select('territory_drafts.document')
		.where('sheets.id', '=', sheetId)
		.executeTakeFirst();

/** Inks of the last revision that had any, by territory key. */
export async function latestTerritoryInks(
	db: Db,
	sheetId: string,
): Promise<Record<string, number> | null> {
	const row = await db
		.selectFrom('territory_drafts')
		.select('inks')
		.where('sheet_id', '=', sheetId)
		.where('inks', '!=', sql<never>`'{}'::jsonb`)
		.orderBy('revision', 'desc')
		.limit(1)
		.executeTakeFirst();
	return row?.inks ?? null;
}

export interface NewTerritoryDraft {
	sheetId: string;
	revision: number;
	document: unknown;
	inks: Record<string, number>;
	/** what it came from: `edited`, `column`, `scratch`, or `proposal 3` */
	change: string;
	savedBy: string | null;
}

/** Adds a revision and makes it the sheet's current one. The caller holds the sheet. */
export async function insertTerritoryDraft(trx: Db, draft: NewTerritoryDraft): Promise<Date> {
	const { saved_at } = await trx
		.insertInto('territory_drafts')
		.values({
			sheet_id: draft.sheetId,
			revision: draft.revision,
			document: JSON.stringify(draft.document),
			inks: JSON.stringify(draft.inks),
			change: draft.change,
			saved_by: draft.savedBy,
		})
		.returning('saved_at')
		.executeTakeFirstOrThrow();
	await trx
		.updateTable('sheets')
		.set({ territory_revision: draft.revision, updated_at: sql`now()` })
		.where('id', '=', draft.sheetId)
		.execute();
	return saved_at;
}
