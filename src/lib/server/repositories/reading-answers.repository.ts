import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow } from '../database/schema.ts';

/** What the members of a team answered about files. */

/** Enters an answer in place of an earlier one about the same. */
export async function putAnswer(trx: Db, answer: NewRow<'reading_answers'>): Promise<void> {
	const { options, file_name, answered_by } = answer;
	await trx
		.insertInto('reading_answers')
		.values(answer)
		.onConflict((same) =>
			same
				.columns(['team_id', 'about', 'likeness'])
				.doUpdateSet({ options, file_name, answered_by, answered_at: sql`now()` }),
		)
		.execute();
}

/** The latest answers of a team, newest first. */
export const listAnswers = (db: Db, teamId: string, most: number) =>
	db
		.selectFrom('reading_answers')
		.leftJoin('User', 'User.id', 'reading_answers.answered_by')
		.selectAll('reading_answers')
		.select(['User.name as by_name', 'User.email as by_email'])
		.where('team_id', '=', teamId)
		.orderBy('answered_at', 'desc')
		.limit(most)
		.execute();
export type AnswerRow = Awaited<ReturnType<typeof listAnswers>>[number];

/** Forgets an answer; false when there is none such. */
export async function deleteAnswer(
	trx: Db,
	teamId: string,
	about: AnswerRow['about'],
	likeness: string,
): Promise<boolean> {
	const { numDeletedRows } = await trx
		.deleteFrom('reading_answers')
		.where('team_id', '=', teamId)
		.where('about', '=', about)
		.where('likeness', '=', likeness)
		.executeTakeFirst();
	return numDeletedRows > 0n;
}
