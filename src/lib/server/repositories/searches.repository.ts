import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { SearchState } from '../../schemas/search.ts';
import type { NewRow, Row } from '../database/schema.ts';
import type { Claim } from './claims.repository.ts';

const open = ['waiting', 'running'] as const;

/** Makes the next search of a sheet, which the caller holds. */
export const insertSearch = (trx: Db, search: Omit<NewRow<'searches'>, 'number' | 'state'>) =>
	trx
		.insertInto('searches')
		.values(({ selectFrom }) => ({
			...search,
			state: 'waiting' as const,
			number: selectFrom('searches')
				.where('sheet_id', '=', search.sheet_id)
				.select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
		}))
		.returning(['id', 'number'])
		.executeTakeFirstOrThrow();

const noteColumns = [
	'searches.id',
	'searches.number',
	'searches.state',
	'searches.question',
	'searches.times',
	'searches.revision',
	'searches.step',
	'searches.share',
	'searches.gain',
	'searches.sentence',
	'searches.stored_revision',
	'searches.created_at',
	'searches.updated_at',
] as const;

const notes = (db: Db, sheetId: string) =>
	db
		.selectFrom('searches')
		.leftJoin('User', 'User.id', 'searches.created_by')
		.select(noteColumns)
		.select(['User.name as by_name', 'User.email as by_email'])
		.where('searches.sheet_id', '=', sheetId);

/** The newest first, without what they found. */
export const listSearches = (db: Db, sheetId: string) =>
	notes(db, sheetId).orderBy('searches.number', 'desc').limit(20).execute();
export type SearchNoteRow = Awaited<ReturnType<typeof listSearches>>[number];

export const findSearch = (db: Db, sheetId: string, number: number) =>
	notes(db, sheetId)
		.select('searches.result')
		.where('searches.number', '=', number)
		.executeTakeFirst();

/** One whole, held against every other change until the transaction ends. */
export const holdSearch = (trx: Db, sheetId: string, number: number) =>
	trx
		.selectFrom('searches')
		.selectAll()
		.where('sheet_id', '=', sheetId)
		.where('number', '=', number)
		.forUpdate()
		.executeTakeFirst();

/** A search that this claim holds, not locked. */
export const claimedSearch = (db: Db, { id, claim }: Claim): Promise<Row<'searches'> | undefined> =>
	db
		.selectFrom('searches')
		.selectAll()
		.where('id', '=', id)
		.where('claim', '=', claim)
		.executeTakeFirst();

/** Those that wait or run: of a sheet, and of its team. */
export async function countOpenSearches(
	db: Db,
	{ sheetId, teamId }: { sheetId: string; teamId: string },
): Promise<{ ofSheet: number; ofTeam: number }> {
	const rows = await db
		.selectFrom('searches')
		.select('sheet_id')
		.where('team_id', '=', teamId)
		.where('state', 'in', open)
		.execute();
	const ofSheet = rows.filter((row) => row.sheet_id === sheetId).length;
	return { ofSheet, ofTeam: rows.length };
}

export interface SearchEnd {
	state: SearchState;
	sentence: string;
	gain?: Row<'searches'>['gain'];
	/** as JSON */
	result?: string | null;
	stored_revision?: number | null;
}

/** Ends a search that waits or runs, and whatever claim there was on it; false when it had ended. */
export async function endSearch(trx: Db, id: string, end: SearchEnd): Promise<boolean> {
	const { result, ...plain } = end;
	const { numUpdatedRows } = await trx
		.updateTable('searches')
		.set({
			...plain,
			...(result === undefined ? {} : { result }),
			...{ step: '', claim: null, updated_at: sql`now()` },
		})
		.where('id', '=', id)
		.where('state', 'in', open)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}
