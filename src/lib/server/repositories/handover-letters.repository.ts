import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow, Row } from '../database/schema.ts';

/** Letters that go out with a handover list, and the answers that come back. */

/** Enters letters; those that this press has asked for already are left out and not answered for. */
export async function insertLetters(
	trx: Db,
	letters: NewRow<'handover_letters'>[],
): Promise<{ id: string; territory_key: string }[]> {
	if (letters.length === 0) return [];
	return trx
		.insertInto('handover_letters')
		.values(letters)
		.onConflict((conflict) =>
			conflict.columns(['handover_id', 'territory_key', 'press']).doNothing(),
		)
		.returning(['id', 'territory_key'])
		.execute();
}

/** Every letter of a list, the latest first. */
export const readLetters = (db: Db, handoverId: string): Promise<Row<'handover_letters'>[]> =>
	db
		.selectFrom('handover_letters')
		.selectAll()
		.where('handover_id', '=', handoverId)
		.orderBy('created_at', 'desc')
		.orderBy('id')
		.execute();

export async function markSent(db: Db, id: string): Promise<void> {
	await db
		.updateTable('handover_letters')
		.set({ sent_at: new Date(), failure: null })
		.where('id', '=', id)
		.execute();
}

export async function markFailed(db: Db, id: string, failure: string): Promise<void> {
	await db.updateTable('handover_letters').set({ failure }).where('id', '=', id).execute();
}

export async function markAnswered(trx: Db, id: string): Promise<void> {
	await trx
		.updateTable('handover_letters')
		.set({ answered_at: new Date() })
		.where('id', '=', id)
		.execute();
}

/** Ends the links of a list, or of one of its territories; answers whom they had gone to. */
export function revokeLetters(trx: Db, handoverId: string, territoryKey?: string) {
	const all = trx
		.updateTable('handover_letters')
		.set({ revoked_at: new Date() })
		.where('handover_id', '=', handoverId)
		.where('revoked_at', 'is', null)
		.returning(['territory_key', 'email']);
	return (
		territoryKey === undefined ? all : all.where('territory_key', '=', territoryKey)
	).execute();
}

/** The letter behind a link that still works, with the list, its sheet and its team. */
export const findLetter = (db: Db, tokenHash: Buffer) =>
	db
		.selectFrom('handover_letters')
		.innerJoin('handovers', 'handovers.id', 'handover_letters.handover_id')
		.innerJoin('sheets', 'sheets.id', 'handovers.sheet_id')
		.innerJoin('teams', 'teams.id', 'sheets.team_id')
		.leftJoin('User', 'User.id', 'handover_letters.created_by')
		.selectAll('handover_letters')
		.select([
			'handovers.number',
			'handovers.state',
			'handovers.measures',
			'handovers.note',
			'sheets.number as sheet_number',
			'teams.id as team_id',
			'teams.slug as team_slug',
			'teams.name as team_name',
			'User.name as by_name',
			'User.email as by_email',
		])
		.select(sql<string>`to_char(handovers.effective_on, 'YYYY-MM-DD')`.as('effective_on'))
		.where('token_hash', '=', tokenHash)
		.where('handover_letters.revoked_at', 'is', null)
		.where('handover_letters.expires_at', '>', sql<Date>`now()`)
		.where('handovers.state', '!=', 'withdrawn')
		.executeTakeFirst();
export type LetterRow = NonNullable<Awaited<ReturnType<typeof findLetter>>>;

export async function insertAnswer(trx: Db, answer: NewRow<'handover_answers'>): Promise<void> {
	await trx.insertInto('handover_answers').values(answer).execute();
}

/** Every answer given to the moves of a list, in the order they came. */
export const readAnswers = (db: Db, handoverId: string): Promise<Row<'handover_answers'>[]> =>
	db
		.selectFrom('handover_answers')
		.selectAll()
		.where('handover_id', '=', handoverId)
		.orderBy('id')
		.execute();
