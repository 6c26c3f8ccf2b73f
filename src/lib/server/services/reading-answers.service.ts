import type { AnswerAbout, RememberedAnswer, RememberedRow } from '../../schemas/desk.ts';
import { mayDo, requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { KnownAnswer } from '../jobs/read-answered.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	deleteAnswer,
	listAnswers,
	putAnswer,
	type AnswerRow,
} from '../repositories/reading-answers.repository.ts';
import { record } from './activity.service.ts';
import { answerInWords, type AnswerOptions } from './answer-words.ts';
import { NotFound } from './outcomes.ts';
import { personName } from './people.ts';

/** A team that answered more has the oldest passed over. */
const mostKnown = 1_000;
/** as the column has it */
const longestLikeness = 200;

/** Everything the team answered so far, as readings take it. */
export const knownAnswers = async (db: Db, teamId: string): Promise<KnownAnswer[]> =>
	(await listAnswers(db, teamId, mostKnown)).map(knownOf);

const knownOf = (row: AnswerRow): KnownAnswer => ({
	about: row.about,
	likeness: row.likeness,
	options: row.options as KnownAnswer['options'],
	words: answerInWords(row.options as AnswerOptions),
	fileName: row.file_name,
	answeredBy: personName(row),
	answeredAt: row.answered_at.toISOString(),
});

/** As it is kept beside a reading that took it, and told. */
export const rememberedNote = (answer: KnownAnswer): RememberedAnswer => {
	const { about, words, fileName, answeredBy, answeredAt } = answer;
	return { about, words, fileName, answeredBy, answeredAt };
};

/** What the team's files are read by, for those who may upload. */
export async function rememberedAnswers(
	shop: Pick<Workshop, 'db'>,
	member: Member,
): Promise<RememberedRow[]> {
	requireAccess(member, 'sheet.read');
	if (!mayDo(member, 'boundaries.upload')) return [];
	const known = await knownAnswers(shop.db, member.team.id);
	return known.map((one) => ({ ...rememberedNote(one), likeness: one.likeness }));
}

/** Forgets an answer: the next file that looks alike is asked about again. */
export async function forgetAnswer(
	shop: Pick<Workshop, 'db'>,
	member: Member,
	about: AnswerAbout,
	likeness: string,
): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	await shop.db.transaction().execute(async (trx) => {
		if (!(await deleteAnswer(trx, member.team.id, about, likeness))) {
			throw new NotFound('remembered answer');
		}
		await record(trx, member, 'boundaries.answer-forgotten', null, { about });
	});
}

export interface GivenAnswer {
	teamId: string;
	userId: string | null;
	about: AnswerAbout;
	likeness: string;
	options: AnswerOptions;
	fileName: string;
}

/** Keeps an answer for the team's next file that looks alike. */
export async function rememberAnswer(trx: Db, given: GivenAnswer): Promise<void> {
	if (given.likeness === '' || given.likeness.length > longestLikeness) return;
	await putAnswer(trx, {
		team_id: given.teamId,
		about: given.about,
		likeness: given.likeness,
		options: JSON.stringify(given.options),
		file_name: given.fileName,
		answered_by: given.userId,
	});
}

/**
 * Keeps the key and name columns that a member chose for a file that was read by them. What a program sends
 * is for its own file: it says so each time.
 */
export async function rememberColumns(
	trx: Db,
	read: Omit<GivenAnswer, 'about' | 'options'>,
	{ keyField, nameField }: AnswerOptions,
): Promise<void> {
	if (read.userId === null || (keyField === undefined && nameField === undefined)) return;
	const options = {
		...(keyField === undefined ? {} : { keyField }),
		...(nameField === undefined ? {} : { nameField }),
	};
	await rememberAnswer(trx, { ...read, about: 'columns', options });
}
