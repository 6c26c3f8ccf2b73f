import type { SendLetters } from '../../schemas/handover.ts';
import { requireAccess, type Member } from '../access/member.ts';
import { digestOf, newSecret } from '../access/secret.ts';
import { config } from '../config.ts';
import type { Db, Trx } from '../database/connection.ts';
import type { Workshop } from '../jobs/workshop.ts';
import { log } from '../log.ts';
import { sendMail, type Message } from '../mail/transport.ts';
import {
	insertLetters,
	markFailed,
	markSent,
	readLetters,
	revokeLetters,
} from '../repositories/handover-letters.repository.ts';
import type { HandoverRow } from '../repositories/handovers.repository.ts';
import { letterMail } from './handover-letter-text.ts';
import { recordHandover, withOpenHandover } from './handover-held.ts';
import { handoverView, worksStill } from './handover-view.ts';
import { limits, use } from './limits.service.ts';
import { NotFound, Refused, TooMany } from './outcomes.ts';
import { nameOfMember } from './people.ts';
import type { TerritoryState } from './territory-state.ts';

/** How long a link to answer by works. */
export const LETTER_DAYS = 60;

export interface Sent {
	sent: number;
	failed: number;
	/** concerned, and no address is known */
	withoutAddress: number;
}

interface Outgoing {
	id: string;
	message: Message;
}

type Reading = Pick<Workshop, 'db'>;

/**
 * Sends each territory that gains or loses its own moves, with a link to answer by: to everybody who has no
 * letter that works, or to one territory again, whose earlier link then ends. Pressing twice sends once. A
 * letter that cannot be sent is noted as such, with the reason, and can be sent again.
 */
export async function sendLetters(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
	asked: SendLetters,
): Promise<Sent> {
	requireAccess(member, 'handover.edit');
	if (!config().mail) throw new Refused('No mail server is set up, so no letters can be sent.');
	const { outgoing, withoutAddress } = await withOpenHandover(
		shop,
		member,
		number,
		handover,
		(trx, row, now) => prepareLetters(trx, member, { row, now }, asked),
	);
	const sent = await postAll(shop.db, member, outgoing);
	return { sent, failed: outgoing.length - sent, withoutAddress };
}

/** A mail server that has not taken two in a row is not waited for again. */
async function postAll(db: Db, member: Member, outgoing: readonly Outgoing[]): Promise<number> {
	let [sent, refusals] = [0, 0];
	for (const letter of outgoing) {
		if (refusals === 2) {
			await markFailed(db, letter.id, 'The mail server takes nothing at the moment.');
			continue;
		}
		const taken = await post(db, member, letter);
		refusals = taken ? 0 : refusals + 1;
		sent += Number(taken);
	}
	return sent;
}

type Held = { row: HandoverRow; now: TerritoryState };

async function prepareLetters(
	trx: Trx,
	member: Member,
	held: Held,
	{ press, figures, territory }: SendLetters,
): Promise<{ outgoing: Outgoing[]; withoutAddress: number }> {
	const view = await handoverView(trx, held.row, held.now);
	const pressed = (await readLetters(trx, held.row.id)).filter((one) => one.press === press);
	const wanted = view.territories.filter((one) =>
		territory === undefined ? !one.letter || !worksStill(one.letter) : one.key === territory,
	);
	if (territory !== undefined && wanted.length === 0) throw new NotFound('territory');
	const reached = wanted.filter(({ email }) => email !== '');
	const open = reached.filter(({ key }) => !pressed.some((one) => one.territory_key === key));
	const sender = await nameOfMember(trx, member);
	const outgoing: Outgoing[] = [];
	for (const { key, email } of open) {
		const letter = await enter(trx, member, held.row.id, { key, email, press, figures });
		if (!letter) continue;
		const { id, secret, expiresAt } = letter;
		const link = `${config().origin}/handover/${secret}`;
		const words = { view, key, figures: figures === 'yes', sender, team: member.team.name };
		outgoing.push({
			id,
			message: letterMail({ ...words, to: email.toLowerCase(), link, expiresAt }),
		});
	}
	if (outgoing.length > 0) {
		const territories = open.map(({ key }) => key);
		const detail = { territories, figures: figures === 'yes' };
		await recordHandover(trx, member, 'letters-sent', held, detail);
	}
	return { outgoing, withoutAddress: wanted.length - reached.length };
}

interface Wanted {
	key: string;
	email: string;
	press: string;
	figures?: 'yes';
}

async function enter(
	trx: Trx,
	member: Member,
	handoverId: string,
	{ key, email, press, figures }: Wanted,
) {
	await revokeLetters(trx, handoverId, key);
	const secret = newSecret();
	const expiresAt = new Date(Date.now() + LETTER_DAYS * 86_400_000);
	const [letter] = await insertLetters(trx, [
		{
			...{ handover_id: handoverId, territory_key: key, press },
			email: email.toLowerCase(),
			token_hash: digestOf(secret),
			with_figures: figures === 'yes',
			...{ expires_at: expiresAt, created_by: member.userId },
			...{ failure: null, sent_at: null },
		},
	]);
	return letter && { id: letter.id, secret, expiresAt };
}

/** @returns whether the mail server took it */
async function post(db: Db, member: Member, { id, message }: Outgoing): Promise<boolean> {
	try {
		await use(limits.mailsFromTeam, member.team.id);
		await use(limits.mailsToPerson, message.to);
		await sendMail(message);
	} catch (problem) {
		const tooMany = problem instanceof TooMany;
		if (!tooMany) log.warn({ letter: id, error: String(problem) }, 'a letter could not be sent');
		await markFailed(db, id, tooMany ? problem.message : 'The mail server did not take it.');
		return false;
	}
	await markSent(db, id);
	return true;
}

/** Ends the link of one territory's letter before its time. */
export async function endLetter(
	shop: Reading,
	member: Member,
	number: number,
	handover: number,
	territory: string,
): Promise<void> {
	requireAccess(member, 'handover.edit');
	await withOpenHandover(shop, member, number, handover, async (trx, row, now) => {
		const ended = await revokeLetters(trx, row.id, territory);
		if (ended.length === 0) throw new NotFound('letter');
		await recordHandover(trx, member, 'letter-ended', { row, now }, { territory });
	});
}
