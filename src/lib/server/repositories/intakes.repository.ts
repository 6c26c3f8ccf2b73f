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
		.where('state', 'in', ['waiting', 'reading', 'asking'])
		.executeTakeFirstOrThrow();
	return Number(open);
}

export interface IntakeEnd {
	state: IntakeState;
	step: string;
	share: number;
	refusal?: string | null;
	file_digest?: string | null;
	boundary_set_id?: string;
	attempts?: number;
	sheet_id?: string;
	options?: string;
	question?: string | null;
	remembered?: string | null;
}

/** Moves an intake on; `from` are the states it may be in. Answers false when it was in none of them. */
export async function moveIntake(
	trx: Db,
	id: string,
	from: IntakeState[],
	end: IntakeEnd,
): Promise<boolean> {
	const { refusal, question, remembered, ...plain } = end;
	const { numUpdatedRows } = await trx
		.updateTable('intakes')
		.set({
			...plain,
			...(refusal === undefined ? {} : { refusal }),
			...(question === undefined ? {} : { question }),
			...(remembered === undefined ? {} : { remembered }),
			claim: null,
			updated_at: sql`now()`,
		})
		.where('id', '=', id)
		.where('state', 'in', from)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/** Intakes that wait for an answer since before so many days. */
export const unanswered = (db: Db, days: number) =>
	db
		.selectFrom('intakes')
		.selectAll()
		.where('state', '=', 'asking')
		.where('updated_at', '<', sql<Date>`now() - make_interval(days => ${days})`)
		.execute();

/** The sheet that came of an upload, and how large it is. */
export const sheetOfIntake = (db: Db, id: string) =>
	db
		.selectFrom('intakes')
		.innerJoin('sheets', 'sheets.id', 'intakes.sheet_id')
		.innerJoin('boundary_sets', 'boundary_sets.id', 'sheets.boundary_set_id')
		.select(['sheets.team_id', 'sheets.number', 'boundary_sets.region_count'])
		.where('intakes.id', '=', id)
		.executeTakeFirst();
