import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow, RecutState, Row } from '../database/schema.ts';

/** Changes of a sheet's boundaries: read, compared, applied, put back. */

/** Makes the next re-cut of a sheet, which the caller holds. */
export const insertRecut = (trx: Db, recut: Omit<NewRow<'recuts'>, 'number'>) =>
	trx
		.insertInto('recuts')
		.values(({ selectFrom }) => ({
			...recut,
			number: selectFrom('recuts')
				.where('sheet_id', '=', recut.sheet_id)
				.select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
		}))
		.returning(['id', 'number'])
		.executeTakeFirstOrThrow();

const people = [
	'maker.name as by_name',
	'maker.email as by_email',
	'applier.name as applied_name',
	'applier.email as applied_email',
	'backer.name as back_name',
	'backer.email as back_email',
] as const;

const withPeople = (db: Db) =>
	db
		.selectFrom('recuts')
		.leftJoin('User as maker', 'maker.id', 'recuts.created_by')
		.leftJoin('User as applier', 'applier.id', 'recuts.applied_by')
		.leftJoin('User as backer', 'backer.id', 'recuts.put_back_by')
		.select(people);

/** Without the long columns: what is found of regions and what is kept to be put back. */
const noteColumns = [
	'recuts.id',
	'recuts.team_id',
	'recuts.sheet_id',
	'recuts.number',
	'recuts.kind',
	'recuts.state',
	'recuts.from_set',
	'recuts.to_set',
	'recuts.file_name',
	'recuts.file_bytes',
	'recuts.file_digest',
	'recuts.options',
	'recuts.words',
	'recuts.step',
	'recuts.share',
	'recuts.created_at',
	'recuts.applied_at',
	'recuts.put_back_at',
] as const;

/** Every re-cut but those that were dropped or cancelled, the newest first. */
export const listRecuts = (db: Db, sheetId: string) =>
	withPeople(db)
		.select(noteColumns)
		.where('recuts.sheet_id', '=', sheetId)
		.where('recuts.state', 'not in', ['dropped', 'cancelled'])
		.orderBy('recuts.number', 'desc')
		.limit(200)
		.execute();
export type RecutNote = Awaited<ReturnType<typeof listRecuts>>[number];

export const findRecutNote = (db: Db, sheetId: string, number: number) =>
	withPeople(db)
		.select(noteColumns)
		.where('recuts.sheet_id', '=', sheetId)
		.where('recuts.number', '=', number)
		.executeTakeFirst();

/** The same with everything its page shows, but for the whole matching. */
export const findRecut = (db: Db, sheetId: string, number: number) =>
	withPeople(db)
		.select(noteColumns)
		.select([
			'recuts.question',
			'recuts.remembered',
			'recuts.refusal',
			'recuts.comparison',
			'recuts.decisions',
			'recuts.report',
			'recuts.before',
		])
		.where('recuts.sheet_id', '=', sheetId)
		.where('recuts.number', '=', number)
		.executeTakeFirst();
export type RecutRecord = NonNullable<Awaited<ReturnType<typeof findRecut>>>;

/** One whole, held against every other change until the transaction ends. */
export const holdRecut = (trx: Db, sheetId: string, number: number) =>
	trx
		.selectFrom('recuts')
		.selectAll()
		.where('sheet_id', '=', sheetId)
		.where('number', '=', number)
		.forUpdate()
		.executeTakeFirst();
export type HeldRecut = Row<'recuts'>;

export const readMatching = async (db: Db, id: string) =>
	(await db.selectFrom('recuts').select('matching').where('id', '=', id).executeTakeFirst())
		?.matching ?? null;

/** Those of a sheet that are open: they wait, are read, ask, or can be applied. */
export async function countOpenRecuts(db: Db, sheetId: string): Promise<number> {
	const { open } = await db
		.selectFrom('recuts')
		.select(({ fn }) => fn.countAll<number>().as('open'))
		.where('sheet_id', '=', sheetId)
		.where('state', 'in', ['waiting', 'reading', 'asking', 'ready', 'failed'])
		.executeTakeFirstOrThrow();
	return Number(open);
}

type Change = Partial<
	Pick<
		NewRow<'recuts'>,
		| 'from_set'
		| 'to_set'
		| 'file_digest'
		| 'options'
		| 'words'
		| 'attempts'
		| 'decisions'
		| 'applied_by'
		| 'applied_at'
		| 'put_back_by'
		| 'put_back_at'
	>
> & {
	state?: RecutState;
	step?: string;
	share?: number;
} & { [column in JsonColumn]?: string | null };
type JsonColumn =
	'question' | 'remembered' | 'refusal' | 'comparison' | 'matching' | 'report' | 'before';

/**
 * Changes a re-cut that is in one of these states, and ends whatever claim there was on it; false when it is
 * in none of them.
 */
export async function changeRecut(
	trx: Db,
	id: string,
	from: RecutState[],
	change: Change,
): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('recuts')
		.set({ ...(change as object), claim: null, updated_at: sql`now()` })
		.where('id', '=', id)
		.where('state', 'in', from)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/** Holds every re-cut of a sheet, and answers which sets and files they refer to. */
export async function holdRecutsOf(
	trx: Db,
	sheetId: string,
): Promise<{ sets: string[]; digests: string[] }> {
	const rows = await trx
		.selectFrom('recuts')
		.select(['from_set', 'to_set', 'file_digest'])
		.where('sheet_id', '=', sheetId)
		.orderBy('number')
		.forUpdate()
		.execute();
	return {
		sets: rows.flatMap((row) => (row.to_set ? [row.from_set, row.to_set] : [row.from_set])),
		digests: rows.flatMap((row) => row.file_digest ?? []),
	};
}

/** Those that wait for an answer since before so many days. */
export const unansweredRecuts = (db: Db, days: number) =>
	db
		.selectFrom('recuts')
		.select(['id', 'team_id', 'sheet_id', 'number', 'file_digest'])
		.where('state', '=', 'asking')
		.where('updated_at', '<', sql<Date>`now() - make_interval(days => ${days})`)
		.execute();
