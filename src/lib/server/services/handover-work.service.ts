import type { MoveStateChange } from '../../schemas/handover.ts';
import { requireAccess, type Member } from '../access/member.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { insertAnswer, revokeLetters } from '../repositories/handover-letters.repository.ts';
import {
	approveMoves,
	changeMove,
	changeOpenHandover,
	readMoves,
} from '../repositories/handovers.repository.ts';
import { handoverDigest } from './handover-content.ts';
import { keptData, partsNow, staleSentence } from './handover-data.ts';
import { contradicted } from './handover-moves.ts';
import { recordHandover, withOpenHandover } from './handover-held.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { nameOfMember } from './people.ts';
import type { DataParts } from './proposal-data.ts';

/** Working on an open list: reasons, states of moves, confirming, withdrawing, approving. */

type Reading = Pick<Workshop, 'db'>;

export async function changeReason(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
	{ move, reason }: { move: number; reason: string },
): Promise<void> {
	requireAccess(member, 'handover.edit');
	await withOpenHandover(shop, member, number, handover, async (trx, row, now) => {
		if (!(await changeMove(trx, row.id, move, { reason }))) throw new NotFound('move');
		await recordHandover(trx, member, 'reason-changed', { row, now }, { move, reason });
	});
}

/**
 * A planner says where a move stands, as after a telephone call: accepted settles a dispute, disputed needs
 * a word why. Whoever has a letter may still dispute it afterwards.
 */
export async function changeMoveState(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
	{ move, state, word }: MoveStateChange,
): Promise<void> {
	requireAccess(member, 'handover.edit');
	await withOpenHandover(shop, member, number, handover, async (trx, row, now) => {
		const by = await nameOfMember(trx, member);
		// a move that is open again has no one who answered it
		const change = { state, word, changed_by: state === 'proposed' ? '' : by };
		if (!(await changeMove(trx, row.id, move, change))) throw new NotFound('move');
		await insertAnswer(trx, {
			...{ handover_id: row.id, ordinal: move, territory_key: null },
			...{ answer: state, word, author: by },
		});
		await recordHandover(trx, member, `move-${state}`, { row, now }, { move, word });
	});
}

/**
 * A planner has looked at what changed since and keeps the list as it is: its figures stay those of the day
 * it was made. Where a move no longer leads to where the territories stand, only a new list helps.
 */
export async function confirmHandover(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
): Promise<void> {
	requireAccess(member, 'handover.edit');
	await withOpenHandover(shop, member, number, handover, async (trx, row, now) => {
		const changed = staleSentence(row, now);
		if (changed === null) return;
		const adrift = contradicted(await readMoves(trx, row.id), now.document).length;
		if (adrift > 0) {
			const said = adrift === 1 ? '1 move no longer leads' : `${adrift} moves no longer lead`;
			const help = 'Withdraw this list and make a new one.';
			throw new Conflict('adrift', `${said} to where the territories stand. ${help}`);
		}
		const { measures } = row.data_parts as unknown as DataParts;
		const parts = partsNow(now, Object.keys(measures));
		await changeOpenHandover(trx, row.id, keptData(parts));
		await recordHandover(trx, member, 'confirmed', { row, now }, { changed });
	});
}

/** Ends a list that is still open, and every link that was sent with it. The list stays to be read. */
export async function withdrawHandover(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
): Promise<void> {
	requireAccess(member, 'handover.edit');
	await withOpenHandover(shop, member, number, handover, async (trx, row, now) => {
		const ended = await revokeLetters(trx, row.id);
		await changeOpenHandover(trx, row.id, { state: 'withdrawn' });
		await recordHandover(trx, member, 'withdrawn', { row, now }, { letters: ended.length });
	});
}

/**
 * Approves a list as the approver saw it: it is frozen under a digest over all of it. Refused while a move
 * is disputed, when something it stands on has changed, and when the list is another than was seen. Moves
 * that nobody has answered yet do not stand in the way; the page counts them.
 * @param seen digest of the list that was looked at
 */
export async function approveHandover(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
	seen: string,
): Promise<string> {
	requireAccess(member, 'handover.approve');
	return withOpenHandover(shop, member, number, handover, async (trx, row, now) => {
		const moves = await readMoves(trx, row.id);
		const disputed = moves.filter(({ state }) => state === 'disputed').length;
		if (disputed > 0) throw new Conflict('disputed', disputedSentence(disputed));
		const stale = staleSentence(row, now);
		if (stale !== null) {
			const help = 'A planner has to confirm the list first.';
			throw new Conflict('stale', `${stale} ${help}`);
		}
		const digest = handoverDigest(now.sheet.number, row, moves);
		if (digest !== seen) {
			throw new Conflict('changed', 'The list has been changed since you looked. Read it again.');
		}
		await approveMoves(trx, row.id);
		await changeOpenHandover(trx, row.id, {
			...{ state: 'approved', digest },
			...{ approved_by: member.userId, approved_at: new Date() },
		});
		await recordHandover(trx, member, 'approved', { row, now }, { digest });
		return digest;
	});
}

const disputedSentence = (disputed: number): string => {
	const what = disputed === 1 ? '1 move is disputed' : `${disputed} moves are disputed`;
	return `${what}. A planner settles it with those concerned, or plans again without it.`;
};
