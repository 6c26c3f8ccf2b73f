import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow, Row } from '../database/schema.ts';

const open = ['waiting', 'running'] as const;
const standing = [...open, 'done'] as const;

/** Makes the next export of a sheet, which the caller holds. */
export const insertExport = (trx: Db, row: Omit<NewRow<'exports'>, 'number' | 'state'>) =>
	trx
		.insertInto('exports')
		.values(({ selectFrom }) => ({
			...row,
			state: 'waiting' as const,
			number: selectFrom('exports')
				.where('sheet_id', '=', row.sheet_id)
				.select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
		}))
		.returning(['id', 'number'])
		.executeTakeFirstOrThrow();

const notes = (db: Db, sheetId: string) =>
	db
		.selectFrom('exports')
		.leftJoin('User', 'User.id', 'exports.created_by')
		.selectAll('exports')
		.select(['User.name as by_name', 'User.email as by_email'])
		.where('exports.sheet_id', '=', sheetId);

/** Those of editions, which are kept, or those of drafts, which come and go; the newest first. */
export const listExports = (db: Db, sheetId: string, of: 'edition' | 'draft', most: number) =>
	notes(db, sheetId)
		.where('exports.edition', of === 'edition' ? 'is not' : 'is', null)
		.orderBy('exports.number', 'desc')
		.limit(most)
		.execute();
export type ExportRow = Awaited<ReturnType<typeof listExports>>[number];

/** Of these numbers, the newest first. */
export const exportsNumbered = (db: Db, sheetId: string, numbers: readonly number[]) =>
	notes(db, sheetId)
		.where('exports.number', 'in', numbers.length ? numbers : [0])
		.orderBy('exports.number', 'desc')
		.execute();

export const findExport = (db: Db, sheetId: string, number: number) =>
	notes(db, sheetId).where('exports.number', '=', number).executeTakeFirst();

/** What answers this request already, or will. */
export const findStanding = (db: Db, sheetId: string, requestDigest: string) =>
	notes(db, sheetId)
		.where('request_digest', '=', requestDigest)
		.where('state', 'in', standing)
		.executeTakeFirst();

/** One whole, held against every other change until the transaction ends. */
export const holdExport = (trx: Db, sheetId: string, number: number) =>
	trx
		.selectFrom('exports')
		.selectAll()
		.where('sheet_id', '=', sheetId)
		.where('number', '=', number)
		.forUpdate()
		.executeTakeFirst();

/** Those of a team that wait or run. */
export async function countOpenExports(db: Db, teamId: string): Promise<number> {
	const { count } = await db
		.selectFrom('exports')
		.select(({ fn }) => fn.countAll<number>().as('count'))
		.where('team_id', '=', teamId)
		.where('state', 'in', open)
		.executeTakeFirstOrThrow();
	return Number(count);
}

export type ExportEnd = Partial<
	Pick<Row<'exports'>, 'sentence' | 'file_digest' | 'file_bytes' | 'media_type' | 'expires_at'>
> & { state: 'done' | 'failed' | 'cancelled' };

/** Ends one that waits or runs, and whatever claim there was on it; false when it had ended. */
export async function endExport(trx: Db, id: string, end: ExportEnd): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('exports')
		.set({
			...end,
			step: '',
			share: end.state === 'done' ? 1 : 0,
			claim: null,
			updated_at: sql`now()`,
		})
		.where('id', '=', id)
		.where('state', 'in', open)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/** Keeps a draft's file for longer, since it was asked for again. */
export async function keepLonger(trx: Db, id: string, days: number): Promise<void> {
	await trx
		.updateTable('exports')
		.set({ expires_at: sql<Date>`now() + make_interval(days => ${days})` })
		.where('id', '=', id)
		.where('expires_at', 'is not', null)
		.execute();
}

/** Rows whose time is over and that nobody works on. */
export const expiredExports = (db: Db) =>
	db
		.selectFrom('exports')
		.select('id')
		.where('expires_at', '<', sql<Date>`now()`)
		.where('state', 'not in', open)
		.limit(500)
		.execute();

/** Removes a row, if its time is still over; answers the digest of its file. */
export const removeExpired = (trx: Db, id: string) =>
	trx
		.deleteFrom('exports')
		.where('id', '=', id)
		.where('expires_at', '<', sql<Date>`now()`)
		.where('state', 'not in', open)
		.returning('file_digest')
		.executeTakeFirst();

/** Digests of every file that was taken of a sheet. */
export async function exportFiles(db: Db, sheetId: string): Promise<string[]> {
	const rows = await db
		.selectFrom('exports')
		.select('file_digest')
		.where('sheet_id', '=', sheetId)
		.where('file_digest', 'is not', null)
		.execute();
	return rows.flatMap((row) => row.file_digest ?? []);
}
