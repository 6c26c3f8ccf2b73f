import type { Message } from './transport.ts';

export interface HandoverMail {
	to: string;
	sender: string;
	team: string;
	territory: string;
	/** in words, such as `1 January 2027` */
	effectiveOn: string;
	gains: MailMove[];
	losses: MailMove[];
	note: string;
	link: string;
	expiresOn: string;
}

export interface MailMove {
	region: string;
	/** the territory on the other side; null: had none */
	other: string | null;
	reason: string;
	/** `117 hours a year of visits`, none unless the sender said so */
	figures: string[];
}

/** Longer lists are read behind the link. */
const mostLines = 60;

/** The letter to one territory: its own moves, and where to answer them. */
export function handoverMail(mail: HandoverMail): Message {
	const { to, sender, team, territory, effectiveOn, gains, losses, note, link } = mail;
	const name = oneLine(territory);
	return {
		to,
		subject: `${name}: ${regions(gains.length + losses.length)} handed over from ${effectiveOn}`,
		text: [
			`${oneLine(sender)} of ${oneLine(team)} hands over regions from ${effectiveOn}. This is about the territory ${name}.`,
			note && `Note: ${oneLine(note)}`,
			part(`${name} gains ${regions(gains.length)}:`, gains, 'from'),
			part(`${name} loses ${regions(losses.length)}:`, losses, 'to'),
			'Read them and answer each one here:',
			link,
			`The link works until ${mail.expiresOn} and for these moves only. Whoever has it can answer in your name, so keep it to yourself. If you do not know the sender, do nothing.`,
		]
			.filter(Boolean)
			.join('\n\n'),
	};
}

function part(heading: string, moves: readonly MailMove[], way: 'from' | 'to'): string {
	if (moves.length === 0) return '';
	const lines = moves.slice(0, mostLines).map(({ region, other, reason, figures }) => {
		const where = other === null ? 'had no territory' : `${way} ${oneLine(other)}`;
		const facts = [where, ...figures.map(oneLine)].join(', ');
		return `- ${oneLine(region)}, ${facts}: ${oneLine(reason)}`;
	});
	const more = moves.length - lines.length;
	return [heading, ...lines, ...(more > 0 ? [`- and ${more} more, behind the link`] : [])].join(
		'\n',
	);
}

const regions = (count: number): string => (count === 1 ? '1 region' : `${count} regions`);

/** A name with line ends in it could otherwise make a paragraph, or a link, of its own. */
const oneLine = (text: string): string => text.replace(/\s+/g, ' ').trim();
