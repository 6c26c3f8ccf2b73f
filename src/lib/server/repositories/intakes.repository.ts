import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { IntakeState, NewRow } from '../database/schema.ts';

export async function insertIntake(trx: Db, intake: NewRow<'intakes'>): Promise<string> {
	const { id } = await trx
		.insertInto('intakes')
		.values(intake)
		.returning('id')
		.executeTakeFirstOrThrow();
	return id;
}

const withNames = (db: Db) =>
	db
		.selectFrom('intakes')
		.leftJoin('User', 'User.id', 'intakes.created_by')
		.leftJoin('sheets', 'sheets.id', 'intakes.sheet_id')
		.selectAll('intakes')
		.select(['User.name as by_name', 'User.email as by_email', 'sheets.number as sheet_number']);

export const findIntake = (db: Db, teamId: string, id: string) =>
	withNames(db)
		.where('intakes.team_id', '=', teamId)
		.where('intakes.id', '=', id)
		.executeTakeFirst();
export type IntakeRow = NonNullable<Awaited<ReturnType<typeof findIntake>>>;

export const recentIntakes = (db: Db, teamId: string, most: number) =>
	withNames(db)
		.where('intakes.team_id', '=', teamId)
		.orderBy('intakes.created_at', 'desc')
		.limit(most)
		.execute();

export async function countOpenIntakes(db: Db, teamId: string): Promise<number> {
	const { open } = await db
		.selectFrom('intakes')
		.select(({ fn }) => fn.countAll<number>().as('open'))
		.where('team_id', '=', teamId)
		.where('state', 'in', ['waiting', 'reading'])
		.executeTakeFirstOrThrow();
	return Number(open);
}

/**
 * Takes an intake up for reading, if it waits. The answer carries a fresh claim; every later write names it, so that of two readers
 * only the last one counts.
 */
export const claimIntake = (db: Db, id: string) =>
	db
		.updateTable('intakes')
		.set({
			state: 'reading',
			claim: sql`gen_random_uuid()`,
			attempts: sql`attempts + 1`,
			heard_at: sql`now()`,
			updated_at: sql`now()`,
		})
		.where('id', '=', id)
		.where('state', '=', 'waiting')
		.returningAll()
		.executeTakeFirst();

/** A sign of life with the progress so far; false when the claim is no longer good (cancelled, taken over). */
export async function heardOf(
	db: Db,
	id: string,
	claim: string,
	progress: { step: string; share: number },
): Promise<boolean> {
	const { numUpdatedRows } = await db
		.updateTable('intakes')
		.set({ ...progress, heard_at: sql`now()`, updated_at: sql`now()` })
		.where('id', '=', id)
		.where('claim', '=', claim)
		.where('state', '=', 'reading')
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/** Locks the row of an intake that this claim still holds, until the transaction ends. */
export const holdClaim = (trx: Db, id: string, claim: string) =>
	trx
		.selectFrom('intakes')
		.selectAll()
		.where('id', '=', id)
		.where('claim', '=', claim)
		.where('state', '=', 'reading')
		.forUpdate()
		.executeTakeFirst();

export interface IntakeEnd {
	state: IntakeState;
	step: string;
	share: number;
	refusal?: string | null;
	file_digest?: string | null;
	boundary_set_id?: string;
	attempts?: number;
	sheet_id?: string;
}

/** Moves an intake on; `from` are the states it may be in. Answers false when it was in none of them. */
export async function moveIntake(
	trx: Db,
	id: string,
	from: IntakeState[],
	end: IntakeEnd,
): Promise<boolean> {
	const { refusal, ...plain } = end;
	const { numUpdatedRows } = await trx
		.updateTable('intakes')
		.set({
			...plain,
			...(refusal === undefined ? {} : { refusal }),
			claim: null,
			updated_at: sql`now()`,
		})
		.where('id', '=', id)
		.where('state', 'in', from)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/**
 * Lets go of every intake that nobody has spoken for in so long, waiting or being read, and answers which:
 * each is handed to one caller only, and comes up again after as long a silence.
 */
export async function releaseSilent(db: Db, silentSeconds: number): Promise<string[]> {
	const rows = await db
		.updateTable('intakes')
		.set({ state: 'waiting', claim: null, heard_at: sql`now()` })
		.where('state', 'in', ['waiting', 'reading'])
		.where(
			sql<Date>`coalesce(heard_at, created_at)`,
			'<',
			sql<Date>`now() - make_interval(secs => ${silentSeconds})`,
		)
		.returning('id')
		.execute();
	return rows.map(({ id }) => id);
}

/** An intake as the one who reads it holds it. */
export type IntakeClaim = { id: string; claim: string };
