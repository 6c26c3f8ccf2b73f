import type { Question } from '../../engines/boundaries/index.ts';
import type { AnswerFields } from '../../schemas/recut-forms.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Db, Trx } from '../database/connection.ts';
import type { RecutState } from '../database/schema.ts';
import type { FileStore } from '../files/index.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { changeRecut, unansweredRecuts } from '../repositories/recuts.repository.ts';
import { findSheetById, holdSheet } from '../repositories/sheets.repository.ts';
import { answerTo } from './answer-options.ts';
import { Conflict } from './outcomes.ts';
import { rememberAnswer } from './reading-answers.service.ts';
import { recordRecut, removeSet, withRecut, type Held } from './recut-held.ts';
import { optionsOnPresent } from './recut-again.ts';
import { isStale } from './recut-state.ts';
import { dropUnused } from './stored-files.ts';

/** Answers what the file of a re-cut does not say; it is read on, and the team's next such file as well. */
export async function answerRecut(
	shop: Pick<Workshop, 'db' | 'queue'>,
	member: Member,
	number: number,
	recut: number,
	fields: AnswerFields,
): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	await withRecut(shop, member, number, recut, async (trx, { row }) => {
		const question = row.question as unknown as Question | null;
		if (row.state !== 'asking' || !question) {
			throw new Conflict('not-asking', 'Nothing is being asked about this file any more.');
		}
		const { options, columns } = answerTo(question, fields);
		await changeRecut(trx, row.id, ['asking'], {
			...{ state: 'waiting', step: '', share: 0, question: null },
			options: JSON.stringify({ ...row.options, ...options, ...columns }),
		});
		const { about, likeness } = question;
		const given = { teamId: member.team.id, userId: member.userId, fileName: row.file_name };
		await rememberAnswer(trx, { ...given, about, likeness, options });
		await shop.queue.send(trx, 'recut', { recutId: row.id });
		await recordRecut(trx, member, 'answered', number, row, { about });
	});
}

/** Stops a re-cut that waits, is read, asks or has failed, and forgets its file. */
export async function cancelRecut(
	shop: Pick<Workshop, 'db' | 'files'>,
	member: Member,
	number: number,
	recut: number,
): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	await withRecut(shop, member, number, recut, async (trx, held) => {
		const open: RecutState[] = ['waiting', 'reading', 'asking', 'failed'];
		if (!(await end(trx, shop.files, held, open, 'cancelled'))) {
			throw new Conflict('not-open', 'It is not being read any more.');
		}
		await recordRecut(trx, member, 'cancelled', number, held.row);
	});
}

/** Drops a re-cut that was never applied or was put back, with the boundaries that were read for it. */
export async function dropRecut(
	shop: Pick<Workshop, 'db' | 'files'>,
	member: Member,
	number: number,
	recut: number,
): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	await withRecut(shop, member, number, recut, async (trx, held) => {
		const open: RecutState[] = ['ready', 'put-back', 'refused', 'failed', 'asking'];
		if (!(await end(trx, shop.files, held, open, 'dropped'))) {
			throw new Conflict(
				'not-droppable',
				'A re-cut that is applied or being read cannot be dropped. Put it back or stop it first.',
			);
		}
		await recordRecut(trx, member, 'dropped', number, held.row);
	});
}

/** Ends a re-cut and lets go of whatever only it used. */
async function end(
	trx: Trx,
	files: FileStore,
	{ row }: Held,
	from: RecutState[],
	state: 'cancelled' | 'dropped',
): Promise<boolean> {
	const ended = await changeRecut(trx, row.id, from, {
		...{ state, step: '', share: 0, to_set: null, file_digest: null },
		...{ question: null, comparison: null, matching: null, report: null, before: null },
	});
	if (!ended) return false;
	const digests = new Set([...(await removeSet(trx, row.to_set)), row.file_digest ?? '']);
	for (const digest of [...digests].sort()) if (digest) await dropUnused(trx, files, digest);
	return true;
}

/**
 * Has a re-cut read once more: one that failed, or one whose sheet was given other boundaries since, against
 * those. What was decided about the matching begins anew.
 */
export async function retryRecut(
	shop: Pick<Workshop, 'db' | 'files' | 'queue'>,
	member: Member,
	number: number,
	recut: number,
): Promise<void> {
	requireAccess(member, 'boundaries.upload');
	await withRecut(shop, member, number, recut, async (trx, { sheet, row }) => {
		if (row.state !== 'failed' && !isStale(sheet, row)) {
			throw new Conflict('not-stale', 'It is compared with the present boundaries already.');
		}
		const options = await optionsOnPresent(trx, sheet, row);
		await changeRecut(trx, row.id, ['failed', 'ready', 'put-back'], {
			...{ state: 'waiting', step: '', share: 0, attempts: 0, refusal: null },
			...{ from_set: sheet.boundary_set_id, to_set: null, decisions: '[]' },
			...{ comparison: null, matching: null, report: null, before: null },
			options: JSON.stringify(options),
		});
		const [digest] = await removeSet(trx, row.to_set);
		await shop.queue.send(trx, 'recut', { recutId: row.id });
		await recordRecut(trx, member, 'read-again', number, row);
		if (digest) await dropUnused(trx, shop.files, digest);
	});
}

/** Ends every re-cut that has waited so many days for an answer, and forgets its file. */
export async function endUnansweredRecuts(db: Db, files: FileStore, days: number): Promise<void> {
	for (const row of await unansweredRecuts(db, days)) {
		await db.transaction().execute(async (trx) => {
			const number = (await findSheetById(trx, row.sheet_id))?.number ?? 0;
			await holdSheet(trx, row.team_id, number);
			const change = { state: 'cancelled', file_digest: null, question: null } as const;
			if (!(await changeRecut(trx, row.id, ['asking'], change))) return;
			const team = { id: row.team_id, slug: '', name: '' };
			await recordRecut(trx, { team, userId: null, tokenId: null }, 'unanswered', number, row);
			if (row.file_digest) await dropUnused(trx, files, row.file_digest);
		});
	}
}
