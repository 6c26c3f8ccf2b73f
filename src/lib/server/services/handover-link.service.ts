import type { LetterAnswer, LetterPage } from '../../schemas/handover.ts';
import { digestOf } from '../access/secret.ts';
import type { Db, Trx } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';
import type { Workshop } from '../jobs/workshop.ts';
import {
	findLetter,
	insertAnswer,
	markAnswered,
	readAnswers,
	readLetters,
	type LetterRow,
} from '../repositories/handover-letters.repository.ts';
import { changeMove, holdHandover, readMoves } from '../repositories/handovers.repository.ts';
import { record } from './activity.service.ts';
import { limits, use } from './limits.service.ts';
import { standingOf } from './move-answers.ts';
import { Conflict, NotFound } from './outcomes.ts';
import { personName } from './people.ts';

/** What the holder of a letter's link may do: read their own moves and answer each. No account is asked. */

type Reading = Pick<Workshop, 'db'>;
type Move = Row<'handover_moves'>;

/**
 * The page behind a link, or null when it never was, has ended, was withdrawn or is too old: which of them
 * is not told. Tries are counted by the address they come from.
 */
export async function readLetter(
	{ db }: Reading,
	secret: string,
	address: string,
): Promise<LetterPage | null> {
	await use(limits.linksByAddress, address);
	const letter = await findLetter(db, digestOf(secret));
	if (!letter) return null;
	const moves = ownMoves(await readMoves(db, letter.handover_id), letter.territory_key);
	const answers = await readAnswers(db, letter.handover_id);
	return pageOf(letter, moves, answers);
}

const ownMoves = (moves: readonly Move[], key: string): Move[] =>
	moves.filter(({ from_key, to_key }) => from_key === key || to_key === key);

function pageOf(
	letter: LetterRow,
	moves: readonly Move[],
	answers: readonly Row<'handover_answers'>[],
): LetterPage {
	const key = letter.territory_key;
	const lastOf = (ordinal: number) =>
		answers.findLast((one) => one.ordinal === ordinal && one.territory_key === key);
	const [first] = moves;
	const name = first ? (first.to_key === key ? first.to_name : first.from_name) : null;
	return {
		team: letter.team_name,
		sender: personName(letter),
		territory: name ?? key,
		effectiveOn: letter.effective_on,
		note: letter.note,
		approved: letter.state === 'approved',
		expiresAt: letter.expires_at.toISOString(),
		answered: letter.answered_at !== null,
		measures: letter.with_figures
			? letter.measures.map(({ name: of, unit }) => ({ name: of, unit }))
			: [],
		moves: moves.map((move) => {
			const gains = move.to_key === key;
			const last = lastOf(move.ordinal);
			return {
				ordinal: move.ordinal,
				region: move.region_name,
				direction: gains ? 'gain' : 'loss',
				other: gains ? move.from_name : move.to_name,
				figures: letter.with_figures ? move.figures : {},
				reason: move.reason,
				state: move.state,
				answer: last && last.answer !== 'proposed' ? last.answer : null,
				word: last?.word ?? '',
			};
		}),
	};
}

/**
 * Takes the answers that came by a letter; its address is their author. What is the same as before is not
 * written down again. Refused once the list is closed.
 * @returns how many answers were new
 */
export async function answerLetter(
	{ db }: Reading,
	secret: string,
	address: string,
	answers: readonly LetterAnswer[],
): Promise<number> {
	await use(limits.linksByAddress, address);
	return db.transaction().execute(async (trx) => {
		const found = await findLetter(trx, digestOf(secret));
		if (!found) throw new NotFound('letter');
		await holdHandover(trx, found.handover_id);
		const letter = await findLetter(trx, digestOf(secret));
		if (!letter) throw new NotFound('letter');
		if (letter.state !== 'open') {
			throw new Conflict('closed', 'This list is approved by now, so answers come too late.');
		}
		return take(trx, letter, answers);
	});
}

/** Accepts whatever they have not answered yet. @returns how many that were */
export async function acceptRest(shop: Reading, secret: string, address: string): Promise<number> {
	const page = await readLetter(shop, secret, address);
	if (!page) throw new NotFound('letter');
	const open = page.moves.filter(({ answer }) => answer === null);
	const answers = open.map(({ ordinal }) => ({ ordinal, answer: 'accepted' as const, word: '' }));
	return answerLetter(shop, secret, address, answers);
}

async function take(
	trx: Trx,
	letter: LetterRow,
	answers: readonly LetterAnswer[],
): Promise<number> {
	const moves = ownMoves(await readMoves(trx, letter.handover_id), letter.territory_key);
	const before = await readAnswers(trx, letter.handover_id);
	const fresh = answers.filter(({ ordinal, answer, word }) => {
		const last = before.findLast(
			(one) => one.ordinal === ordinal && one.territory_key === letter.territory_key,
		);
		return last?.answer !== answer || last.word !== word;
	});
	for (const { ordinal, answer, word } of fresh) {
		if (!moves.some((move) => move.ordinal === ordinal)) throw new NotFound('move');
		await insertAnswer(trx, {
			...{ handover_id: letter.handover_id, ordinal, territory_key: letter.territory_key },
			...{ answer, word, author: letter.email },
		});
	}
	const changed = fresh.map(({ ordinal }) => ordinal);
	await restate(
		trx,
		letter.handover_id,
		moves.filter(({ ordinal }) => changed.includes(ordinal)),
	);
	if (fresh.length > 0) {
		await markAnswered(trx, letter.id);
		await recordAnswers(trx, letter, fresh);
	}
	return fresh.length;
}

/** Brings the state of moves up to what has been answered. */
async function restate(trx: Db, handoverId: string, moves: readonly Move[]): Promise<void> {
	const answers = await readAnswers(trx, handoverId);
	const letters = await readLetters(trx, handoverId);
	const asked = new Set(
		letters
			.filter((one) => one.sent_at !== null && one.revoked_at === null)
			.map(({ territory_key }) => territory_key),
	);
	for (const { ordinal, from_key, to_key } of moves) {
		const own = answers.filter((one) => one.ordinal === ordinal);
		const both = [from_key, to_key].filter((key): key is string => key !== null && asked.has(key));
		const { state, word, by } = standingOf(own, both);
		await changeMove(trx, handoverId, ordinal, { state, word, changed_by: by });
	}
}

const recordAnswers = (trx: Db, letter: LetterRow, answers: readonly LetterAnswer[]) => {
	const { team_id: id, team_slug: slug, team_name: name } = letter;
	const count = (answer: string) => answers.filter((one) => one.answer === answer).length;
	return record(
		trx,
		{ team: { id, slug, name }, userId: null, tokenId: null },
		'handover.answered',
		{ kind: 'handover', id: letter.handover_id },
		{
			...{ sheet: letter.sheet_number, number: letter.number },
			...{ author: letter.email, territory: letter.territory_key },
			...{ accepted: count('accepted'), disputed: count('disputed') },
		},
	);
};
