import { z } from 'zod';
import type { HandoverNote } from './desk-territories.ts';

/** A handover list as its page and the API show it, and the forms by which it is worked on. */

export interface HandoverMove {
	/** counts from 1 within the list */
	ordinal: number;
	region: { key: string; name: string };
	from: { key: string; name: string } | null;
	to: { key: string; name: string };
	/** value of each measure by its name; none where the figure is missing */
	figures: Record<string, number>;
	reason: string;
	state: 'proposed' | 'accepted' | 'disputed' | 'approved';
	word: string;
	/** who gave the state: a member's name, or the address of a letter */
	by: string;
	changedAt: string;
	/** the territories stand otherwise by now */
	contradicted: boolean;
}

/** A territory that gains or loses by the list. */
export interface HandoverTerritory {
	key: string;
	name: string;
	person: string;
	/** where its letter goes; '' for nowhere */
	email: string;
	gains: number;
	losses: number;
	/** sum over its gains less its losses, by measure */
	balance: Record<string, number>;
	/** the letter that counts: the one sent last */
	letter: HandoverLetter | null;
}

export interface HandoverLetter {
	state: 'on its way' | 'sent' | 'failed' | 'answered' | 'expired' | 'ended';
	email: string;
	withFigures: boolean;
	at: string;
	expiresAt: string;
	/** why it could not be sent */
	failure: string | null;
}

export interface Handover extends Omit<HandoverNote, 'moves'> {
	sheet: { number: number; name: string };
	note: string;
	measures: { name: string; unit: string; confidential: boolean }[];
	moves: HandoverMove[];
	territories: HandoverTerritory[];
	/** SHA-256 over the list as approved; null until then */
	digest: string | null;
	/** whether the stored list still has that digest; null until it is approved */
	intact: boolean | null;
	/** SHA-256 over the list as it is now: what an approver has seen */
	seen: string;
}

/** A proposal that was adopted, from which a list can be made. */
export interface HandoverSource {
	number: number;
	name: string;
	/** a list of it stands already */
	listed: boolean;
}

/** What the holder of a letter's link is shown: their own moves and nothing else of the team. */
export interface LetterPage {
	team: string;
	sender: string | null;
	territory: string;
	effectiveOn: string;
	note: string;
	approved: boolean;
	expiresAt: string;
	answered: boolean;
	/** none unless the sender said so */
	measures: { name: string; unit: string }[];
	moves: {
		ordinal: number;
		region: string;
		direction: 'gain' | 'loss';
		/** the territory on the other side; null: had none */
		other: string | null;
		figures: Record<string, number>;
		reason: string;
		state: HandoverMove['state'];
		/** their own last answer */
		answer: 'accepted' | 'disputed' | null;
		word: string;
	}[];
}

const number = z.coerce.number().int().positive();
const words = (most: number) => z.string().trim().max(most, `Use at most ${most} characters.`);

export const createHandoverForm = z.object({
	proposal: number,
	effectiveOn: z.iso.date('Give the day from which the moves hold.'),
	note: words(2_000).default(''),
	/** ticked: the day lies in the past, and that is meant */
	past: z.literal('yes').optional(),
});
export type CreateHandover = z.output<typeof createHandoverForm>;

export const reasonForm = z.object({ move: number, reason: words(500).min(1, 'Give a reason.') });

export const stateForm = z
	.object({
		move: number,
		state: z.enum(['proposed', 'accepted', 'disputed'], 'Choose one.'),
		word: words(2_000).default(''),
	})
	.refine(({ state, word }) => state !== 'disputed' || word !== '', {
		path: ['word'],
		message: 'Say in a word why it is disputed.',
	});
export type MoveStateChange = z.output<typeof stateForm>;

export const sendForm = z.object({
	/** made with the page: pressing twice sends once */
	press: z.uuid(),
	figures: z.literal('yes').optional(),
	/** one territory again; absent: everybody who has no letter that works */
	territory: z.string().min(1).max(80).optional(),
});
export type SendLetters = z.output<typeof sendForm>;

export const approveForm = z.object({
	seen: z.string().regex(/^[0-9a-f]{64}$/),
});

const answerField = /^(answer|word)\.(\d{1,6})$/;

/** Answers of a letter's page: `answer.<move>` accepted, disputed or '', and `word.<move>`. */
export const answersForm = z
	.record(z.string(), z.union([z.string().max(2_000), z.array(z.string())]))
	.transform((form, context) => {
		const answers: LetterAnswer[] = [];
		for (const [field, value] of Object.entries(form)) {
			const [, kind, ordinal] = answerField.exec(field) ?? [];
			if (kind !== 'answer' || (value !== 'accepted' && value !== 'disputed')) continue;
			const word = String(form[`word.${ordinal}`] ?? '').trim();
			if (value === 'disputed' && word === '') {
				const message = 'Say in a word why.';
				context.addIssue({ code: 'custom', path: [`word.${ordinal}`], message });
			}
			answers.push({ ordinal: Number(ordinal), answer: value, word });
		}
		return answers;
	});
export interface LetterAnswer {
	ordinal: number;
	answer: 'accepted' | 'disputed';
	word: string;
}
