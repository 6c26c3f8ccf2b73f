import { requireAccess, type Member } from '../access/member.ts';
import { database, type Db } from '../database/connection.ts';
import {
	activityKinds,
	countActivity,
	insertActivity,
	listActivity,
	type ActivityFilter,
} from '../repositories/activity.repository.ts';

/** Who did it, as far as the log needs to know. */
export type Actor = Pick<Member, 'team' | 'userId' | 'tokenId'>;

/**
 * Writes down what was done, in the transaction that does it: either both are kept or neither.
 * @param action what happened, as `kind.verb` in the past: `member.invited`, `sheet.renamed`
 * @param subject what it happened to; its id is kept even when the thing itself goes
 * @param detail anything more that a reader of the log needs; never a secret
 */
export async function record(
	trx: Db,
	actor: Actor,
	action: string,
	subject: { kind: string; id: string } | null,
	detail: Record<string, unknown> = {},
): Promise<void> {
	await insertActivity(trx, {
		team_id: actor.team.id,
		user_id: actor.userId,
		token_id: actor.tokenId,
		action,
		subject_kind: subject?.kind ?? null,
		subject_id: subject?.id ?? null,
		detail: JSON.stringify(detail),
	});
}

const PAGE = 50;

/** One page of the team's log, the latest entries first, and what it can be filtered by. */
export async function readActivity(member: Member, filter: ActivityFilter, page: number) {
	requireAccess(member, 'activity.read');
	const db = database();
	const [total, kinds] = await Promise.all([
		countActivity(db, member.team.id, filter),
		activityKinds(db, member.team.id),
	]);
	const pages = Math.max(1, Math.ceil(total / PAGE));
	const shown = Math.min(Math.max(1, page), pages);
	const slice = { offset: (shown - 1) * PAGE, limit: PAGE };
	const entries = await listActivity(db, member.team.id, filter, slice);
	return { entries, total, kinds, page: shown, pages };
}
