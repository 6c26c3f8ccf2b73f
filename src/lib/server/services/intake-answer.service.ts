import type { Question } from '../../engines/boundaries/index.ts';
import type { AnswerFields } from '../../schemas/recut-forms.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import type { FileStore } from '../files/index.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { moveIntake, unanswered } from '../repositories/intakes.repository.ts';
import { record } from './activity.service.ts';
import { answerTo } from './answer-options.ts';
import { intakeOf } from './intake.service.ts';
import { Conflict } from './outcomes.ts';
import { rememberAnswer } from './reading-answers.service.ts';
import { dropUnused } from './stored-files.ts';

/**
 * Answers what a file does not say: it is read on with the answer, and the team's next file that looks
 * alike is read so without being asked about.
 */
export async function answerIntake(
	shop: Pick<Workshop, 'db' | 'queue'>,
	member: Member,
	id: string,
	fields: AnswerFields,
): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	const intake = await intakeOf(shop, member, id);
	const question = intake.question as unknown as Question | null;
	if (intake.state !== 'asking' || !question) throw notAsking();
	const { options, columns } = answerTo(question, fields);
	await shop.db.transaction().execute(async (trx) => {
		const moved = await moveIntake(trx, intake.id, ['asking'], {
			...{ state: 'waiting', step: '', share: 0, question: null },
			options: JSON.stringify({ ...intake.options, ...options, ...columns }),
		});
		if (!moved) throw notAsking();
		const { about, likeness } = question;
		const given = { teamId: member.team.id, userId: member.userId, fileName: intake.file_name };
		await rememberAnswer(trx, { ...given, about, likeness, options });
		await shop.queue.send(trx, 'intake', { intakeId: intake.id });
		const subject = { kind: 'intake', id: intake.id };
		await record(trx, member, 'boundaries.answered', subject, { about });
	});
}

const notAsking = () =>
	new Conflict('not-asking', 'Nothing is being asked about this file any more.');

/** Days after which a file that nobody answers for is let go. */
export const daysToAnswer = 30;

/** Ends every intake that has waited too long for an answer, and forgets its file. */
export async function endUnanswered(db: Db, files: FileStore): Promise<void> {
	for (const intake of await unanswered(db, daysToAnswer)) {
		await db.transaction().execute(async (trx) => {
			const moved = await moveIntake(trx, intake.id, ['asking'], {
				...{ state: 'cancelled', step: '', share: 0, file_digest: null, question: null },
			});
			if (!moved) return;
			const team = { id: intake.team_id, slug: '', name: '' };
			const subject = { kind: 'intake', id: intake.id };
			await record(trx, { team, userId: null, tokenId: null }, 'boundaries.unanswered', subject);
			if (intake.file_digest) await dropUnused(trx, files, intake.file_digest);
		});
	}
}
