import type { Handover, HandoverMove } from '../../schemas/handover.ts';
import { handoverMail, type MailMove } from '../mail/handover-mail.ts';
import type { Message } from '../mail/transport.ts';
import { dayInWords } from './day-in-words.ts';

export interface LetterWords {
	view: Handover;
	/** territory that it goes to */
	key: string;
	to: string;
	sender: string;
	team: string;
	link: string;
	expiresAt: Date;
	figures: boolean;
}

const figure = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 2 });

/** The letter of one territory: what it gains and loses by a list, nothing of the others. */
export function letterMail(words: LetterWords): Message {
	const { view, key, to, sender, team, link } = words;
	const line = (move: HandoverMove, other: string | null): MailMove => ({
		region: move.region.name,
		other,
		reason: move.reason,
		figures: words.figures ? figuresInWords(view, move) : [],
	});
	return handoverMail({
		...{ to, sender, team, link },
		territory: view.territories.find((one) => one.key === key)?.name ?? key,
		effectiveOn: dayInWords(new Date(view.effectiveOn)),
		gains: view.moves
			.filter((move) => move.to.key === key)
			.map((move) => line(move, move.from?.name ?? null)),
		losses: view.moves
			.filter((move) => move.from?.key === key)
			.map((move) => line(move, move.to.name)),
		note: view.note,
		expiresOn: dayInWords(words.expiresAt),
	});
}

const figuresInWords = ({ measures }: Handover, { figures }: HandoverMove): string[] =>
	measures
		.filter(({ name }) => Object.hasOwn(figures, name))
		.map(({ name, unit }) => `${name} ${figure.format(figures[name])}${unit ? ` ${unit}` : ''}`);
