import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { MoveState, NewRow, Row } from '../database/schema.ts';

/** Handover lists and their moves. */

/** Rows a statement: well below the protocol's 65,535 values. */
const chunk = 2_000;

/** Makes the next list of a sheet, which the caller holds. */
export async function insertHandover(
	trx: Db,
	handover: Omit<NewRow<'handovers'>, 'number'>,
	moves: Omit<NewRow<'handover_moves'>, 'handover_id'>[],
): Promise<{ id: string; number: number }> {
	const made = await trx
		.insertInto('handovers')
		.values(({ selectFrom }) => ({
			...handover,
			number: selectFrom('handovers')
				.where('sheet_id', '=', handover.sheet_id)
				.select(sql<number>`coalesce(max(number), 0) + 1`.as('next')),
		}))
		.returning(['id', 'number'])
		.executeTakeFirstOrThrow();
	for (let from = 0; from < moves.length; from += chunk) {
		const rows = moves.slice(from, from + chunk).map((move) => ({ ...move, handover_id: made.id }));
		await trx.insertInto('handover_moves').values(rows).execute();
	}
	return made;
}

const withNames = (db: Db) =>
	db
		.selectFrom('handovers')
		.innerJoin('proposals', 'proposals.id', 'handovers.proposal_id')
		.leftJoin('User as maker', 'maker.id', 'handovers.created_by')
		.leftJoin('User as approver', 'approver.id', 'handovers.approved_by')
		.selectAll('handovers')
		.select(sql<string>`to_char(effective_on, 'YYYY-MM-DD')`.as('effective_on'))
		.select([
			'proposals.number as proposal_number',
			'proposals.name as proposal_name',
			'proposals.territory_revision as before_revision',
			'maker.name as by_name',
			'maker.email as by_email',
			'approver.name as approver_name',
			'approver.email as approver_email',
		]);

/** Lists of a sheet, the newest first. */
export const listHandovers = (db: Db, sheetId: string) =>
	withNames(db)
		.where('handovers.sheet_id', '=', sheetId)
		.orderBy('handovers.number', 'desc')
		.execute();
export type HandoverRow = Awaited<ReturnType<typeof listHandovers>>[number];

export const findHandover = (
	db: Db,
	sheetId: string,
	number: number,
): Promise<HandoverRow | undefined> =>
	withNames(db)
		.where('handovers.sheet_id', '=', sheetId)
		.where('handovers.number', '=', number)
		.executeTakeFirst();

/** Holds a list against every other change until the transaction ends; answers its state. */
export const holdHandover = (trx: Db, id: string) =>
	trx
		.selectFrom('handovers')
		.select(['id', 'state'])
		.where('id', '=', id)
		.forUpdate()
		.executeTakeFirst();

export interface StateCount {
	handover_id: string;
	state: MoveState;
	moves: number;
}

/** How many moves of each list of a sheet are in which state. */
export const countMoves = (db: Db, sheetId: string): Promise<StateCount[]> =>
	db
		.selectFrom('handover_moves')
		.innerJoin('handovers', 'handovers.id', 'handover_moves.handover_id')
		.where('handovers.sheet_id', '=', sheetId)
		.groupBy(['handover_id', 'handover_moves.state'])
		.select(['handover_id', 'handover_moves.state'])
		.select(({ fn }) => fn.countAll<number>().as('moves'))
		.execute();

export const readMoves = (db: Db, handoverId: string): Promise<Row<'handover_moves'>[]> =>
	db
		.selectFrom('handover_moves')
		.selectAll()
		.where('handover_id', '=', handoverId)
		.orderBy('ordinal')
		.execute();

export interface MoveChange {
	reason?: string;
	state?: MoveState;
	word?: string;
	changed_by?: string;
}

/** Changes one move; false when the list has none of this number. */
export async function changeMove(
	trx: Db,
	handoverId: string,
	ordinal: number,
	change: MoveChange,
): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('handover_moves')
		.set({ ...change, changed_at: sql`now()` })
		.where('handover_id', '=', handoverId)
		.where('ordinal', '=', ordinal)
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

export async function approveMoves(trx: Db, handoverId: string): Promise<void> {
	await trx
		.updateTable('handover_moves')
		.set({ state: 'approved' })
		.where('handover_id', '=', handoverId)
		.execute();
}

export interface HandoverChange {
	state?: Row<'handovers'>['state'];
	note?: string;
	effective_on?: string;
	digest?: string;
	data_digest?: string;
	data_parts?: string;
	approved_by?: string | null;
	approved_at?: Date;
}

/** Changes a list that is still open; false when it is not. */
export async function changeOpenHandover(
	trx: Db,
	id: string,
	change: HandoverChange,
): Promise<boolean> {
	const { numUpdatedRows } = await trx
		.updateTable('handovers')
		.set(change)
		.where('id', '=', id)
		.where('state', '=', 'open')
		.executeTakeFirst();
	return numUpdatedRows > 0n;
}

/** Adopted proposals of a sheet, the newest first, and whether a list of them stands. */
export const adoptedProposals = (db: Db, sheetId: string) =>
	db
		.selectFrom('proposals')
		.select(['number', 'name', 'updated_at'])
		.select(({ exists, selectFrom }) =>
			exists(
				selectFrom('handovers')
					.select('handovers.id')
					.whereRef('handovers.proposal_id', '=', 'proposals.id')
					.where('handovers.state', '!=', 'withdrawn'),
			).as('listed'),
		)
		.where('sheet_id', '=', sheetId)
		.where('state', '=', 'adopted')
		.orderBy('number', 'desc')
		.execute();
