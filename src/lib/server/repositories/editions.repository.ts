import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow } from '../database/schema.ts';

export async function nextEditionNumber(trx: Db, sheetId: string): Promise<number> {
	const { last } = await trx
		.selectFrom('editions')
		.select(({ fn }) => fn.max('number').as('last'))
		.where('sheet_id', '=', sheetId)
		.executeTakeFirstOrThrow();
	return (last ?? 0) + 1;
}

export async function insertEdition(
	trx: Db,
	edition: NewRow<'editions'>,
	files: Omit<NewRow<'edition_files'>, 'edition_id'>[],
): Promise<string> {
	const { id } = await trx
		.insertInto('editions')
		.values(edition)
		.returning('id')
		.executeTakeFirstOrThrow();
	await trx
		.insertInto('edition_files')
		.values(files.map((file) => ({ ...file, edition_id: id })))
		.execute();
	return id;
}

const withIssuer = (db: Db) =>
	db
		.selectFrom('editions')
		.leftJoin('User', 'User.id', 'editions.issued_by')
		.select([
			'editions.id',
			'editions.number',
			'editions.digest',
			'editions.note',
			'editions.revision',
			'editions.issued_at',
			'User.name as by_name',
			'User.email as by_email',
		]);

export const listEditions = (db: Db, sheetId: string) =>
	withIssuer(db).where('sheet_id', '=', sheetId).orderBy('number', 'desc').execute();

/** One whole, with its content. */
export const findEdition = (db: Db, sheetId: string, number: number) =>
	db
		.selectFrom('editions')
		.selectAll()
		.where('sheet_id', '=', sheetId)
		.where('number', '=', number)
		.executeTakeFirst();

/** Ink of each region by key; undefined where there is no such edition. */
export async function readEditionColouring(
	db: Db,
	sheetId: string,
	number: number,
): Promise<Record<string, number> | undefined> {
	const row = await db
		.selectFrom('editions')
		.select(sql<Record<string, number>>`content -> 'colouring'`.as('colouring'))
		.where('sheet_id', '=', sheetId)
		.where('number', '=', number)
		.executeTakeFirst();
	return row?.colouring;
}

/** Those that show a measure, by what they name it; the newest first. */
export const listThemedEditions = (db: Db, sheetId: string) =>
	db
		.selectFrom('editions')
		.select([
			'number',
			'issued_at',
			sql<string | null>`content #>> '{theme,figuresAt}'`.as('figures_at'),
			sql<string>`content #>> '{draft,theme,measure}'`.as('measure'),
			sql<string | null>`content #>> '{draft,theme,per,measure}'`.as('divisor'),
		])
		.where('sheet_id', '=', sheetId)
		.where(sql<boolean>`content #>> '{draft,theme,measure}' is not null`)
		.orderBy('number', 'desc')
		.execute();

export const listEditionFiles = (db: Db, sheetId: string) =>
	db
		.selectFrom('edition_files')
		.innerJoin('editions', 'editions.id', 'edition_files.edition_id')
		.select([
			'editions.number',
			'edition_files.name',
			'edition_files.media_type',
			'edition_files.bytes',
		])
		.where('editions.sheet_id', '=', sheetId)
		.orderBy('edition_files.name')
		.execute();

export const findEditionFile = (db: Db, sheetId: string, number: number, name: string) =>
	db
		.selectFrom('edition_files')
		.innerJoin('editions', 'editions.id', 'edition_files.edition_id')
		.selectAll('edition_files')
		.where('editions.sheet_id', '=', sheetId)
		.where('editions.number', '=', number)
		.where('edition_files.name', '=', name)
		.executeTakeFirst();
