import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { MeasureTableState, NewRow, Row } from '../database/schema.ts';

/** Tables of figures and the measures taken over from them. */

/** Makes the next table of a sheet; the caller holds the sheet. */
export const insertMeasureTable = (trx: Db, table: Omit<NewRow<'measure_tables'>, 'number'>) =>
	trx
		.insertInto('measure_tables')
		.values(({ selectFrom }) => ({
			...table,
			number: selectFrom('measure_tables')
				.where('sheet_id', '=', table.sheet_id)
				.select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
		}))
		.returning(['id', 'number'])
		.executeTakeFirstOrThrow();

const withNames = (db: Db) =>
	db
		.selectFrom('measure_tables')
		.leftJoin('User as maker', 'maker.id', 'measure_tables.created_by')
		.leftJoin('User as taker', 'taker.id', 'measure_tables.taken_by')
		.selectAll('measure_tables')
		.select([
			'maker.name as by_name',
			'maker.email as by_email',
			'taker.name as taker_name',
			'taker.email as taker_email',
		]);

export const findMeasureTable = (db: Db, sheetId: string, number: number) =>
	withNames(db)
		.where('measure_tables.sheet_id', '=', sheetId)
		.where('measure_tables.number', '=', number)
		.executeTakeFirst();
export type MeasureTableRow = NonNullable<Awaited<ReturnType<typeof findMeasureTable>>>;

export const listMeasureTables = (db: Db, sheetId: string) =>
	withNames(db)
		.where('measure_tables.sheet_id', '=', sheetId)
		.orderBy('measure_tables.number', 'desc')
		.execute();

export async function countOpenTables(db: Db, sheetId: string): Promise<number> {
	const { open } = await db
		.selectFrom('measure_tables')
		.select(({ fn }) => fn.countAll<number>().as('open'))
		.where('sheet_id', '=', sheetId)
		.where('state', '=', 'open')
		.executeTakeFirstOrThrow();
	return Number(open);
}

export type MeasureTableChange = Partial<
	Pick<
		NewRow<'measure_tables'>,
		| 'name'
		| 'boundary_set_id'
		| 'options'
		| 'row_count'
		| 'matched_count'
		| 'confidential'
		| 'changes'
		| 'taken_by'
		| 'taken_at'
	>
> & { state?: MeasureTableState; source?: string };

/** Changes a table that is in one of these states; false when it is in none of them. */
export async function changeMeasureTable(
	trx: Db,
	id: string,
	from: MeasureTableState[],
	{ source, ...change }: MeasureTableChange,
): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('measure_tables')
		.set({ ...change, ...(source === undefined ? {} : { source }) })
		.where('id', '=', id)
		.where('state', 'in', from)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/** Marks every table none of whose columns is left as replaced. */
export const retireEmptyTables = (trx: Db, sheetId: string) =>
	trx
		.updateTable('measure_tables')
		.set({ state: 'replaced' })
		.where('sheet_id', '=', sheetId)
		.where('state', '=', 'taken')
		.where(({ not, exists, selectFrom }) =>
			not(
				exists(
					selectFrom('measures')
						.select('measures.id')
						.whereRef('measures.table_id', '=', 'measure_tables.id'),
				),
			),
		)
		.returning(['id', 'number'])
		.execute();

const withTables = (db: Db, sheetId: string) =>
	db
		.selectFrom('measures')
		.innerJoin('measure_tables', 'measure_tables.id', 'measures.table_id')
		.where('measures.sheet_id', '=', sheetId)
		.orderBy('measure_tables.number')
		.orderBy('measures.position');

/** Every measure of a sheet with its values, in the order of the tables and their columns. */
export const readMeasures = (db: Db, sheetId: string) =>
	withTables(db, sheetId)
		.selectAll('measures')
		.select([
			'measure_tables.name as table_name',
			'measure_tables.number as table_number',
			'measure_tables.confidential',
			'measure_tables.boundary_set_id',
		])
		.execute();
export type MeasureRow = Awaited<ReturnType<typeof readMeasures>>[number];

/** Measures by their names, with their values and when their table was taken over. */
export const readMeasuresNamed = (db: Db, sheetId: string, names: readonly string[]) =>
	withTables(db, sheetId)
		.where('measures.name', 'in', [...names])
		.where('measures.kind', '=', 'number')
		.select([
			'measures.name',
			'measures.unit',
			'measures.values',
			'measure_tables.name as table_name',
			'measure_tables.taken_at',
			'measure_tables.boundary_set_id',
			'measure_tables.confidential',
		])
		.execute();
export type NamedMeasure = Awaited<ReturnType<typeof readMeasuresNamed>>[number];

/** The same without the long columns: how many are missing and what they add up to. */
export const listMeasures = (db: Db, sheetId: string) =>
	withTables(db, sheetId)
		.select([
			'measures.id',
			'measures.table_id',
			'measures.name',
			'measures.unit',
			'measures.kind',
			'measure_tables.boundary_set_id',
			sql<number>`coalesce(cardinality(array_positions("values", null)),
				cardinality(array_positions(texts, null)), 0)`.as('missing'),
			sql<number | null>`(select sum(v) from unnest("values") v)`.as('total'),
		])
		.execute();

/** Enters measures; one with the id of a measure that is there takes its place and keeps its id. */
export async function putMeasures(
	trx: Db,
	rows: (Omit<Row<'measures'>, 'id'> & { id: string | null })[],
): Promise<string[]> {
	const ids: string[] = [];
	for (const { id, ...row } of rows) {
		if (id === null) {
			const made = await trx
				.insertInto('measures')
				.values(row)
				.returning('id')
				.executeTakeFirstOrThrow();
			ids.push(made.id);
		} else {
			await trx.updateTable('measures').set(row).where('id', '=', id).executeTakeFirstOrThrow();
			ids.push(id);
		}
	}
	return ids;
}

export async function deleteMeasure(trx: Db, sheetId: string, id: string): Promise<boolean> {
	const { numDeletedRows } = await trx
		.deleteFrom('measures')
		.where('sheet_id', '=', sheetId)
		.where('id', '=', id)
		.executeTakeFirst();
	return numDeletedRows > 0n;
}

export async function deleteMeasuresOfTable(trx: Db, tableId: string): Promise<void> {
	await trx.deleteFrom('measures').where('table_id', '=', tableId).execute();
}

/** Ids of the measures that the wishes of the current territory draft name. */
export async function measuresInWishes(db: Db, sheetId: string): Promise<Set<string>> {
	const { rows } = await sql<{ wishes: { tolerances?: object; cost?: string } | null }>`
		select document -> 'wishes' as wishes from sheets
		join territory_drafts drafts on drafts.sheet_id = sheets.id
			and drafts.revision = sheets.territory_revision
		where sheets.id = ${sheetId}
	`.execute(db);
	const wishes = rows[0]?.wishes;
	return new Set([...Object.keys(wishes?.tolerances ?? {}), wishes?.cost ?? '']);
}

/** Digests of every file that the tables of a sheet refer to. */
export async function measureFiles(db: Db, sheetId: string): Promise<string[]> {
	const { rows } = await sql<{ digest: string }>`
		select file_digest as digest from measure_tables where sheet_id = ${sheetId}
		union select source ->> 'kept' from measure_tables
			where sheet_id = ${sheetId} and source ->> 'kept' is not null
	`.execute(db);
	return rows.map(({ digest }) => digest);
}
