import nodemailer, { type Transporter } from 'nodemailer';
import { config } from '../config.ts';

/** A message in plain text; the other form is made from it. */
export interface Message {
	to: string;
	subject: string;
	text: string;
}

let transporter: Transporter | null = null;

/** Sends a message, or throws when the mail server does not take it. */
export async function sendMail(message: Message): Promise<void> {
	const { mail } = config();
	if (!mail) throw new Error('no mail server is set up');
	const waits = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 20_000 };
	transporter ??= nodemailer.createTransport({ url: mail.server, ...waits });
	await transporter.sendMail({
		from: mail.from,
		to: { name: '', address: message.to },
		subject: message.subject.replace(/\s+/g, ' '),
		text: message.text,
		html: asHtml(message.text),
	});
}

const escapes: Record<string, string> = {
	'&': '&amp;',
	'<': '&lt;',
	'>': '&gt;',
	'"': '&quot;',
	"'": '&#39;',
};
const escaped = (text: string): string => text.replace(/[&<>"']/g, (sign) => escapes[sign] ?? sign);

/** The same words in paragraphs, every sign of markup in them escaped; a line that is an address is a link. */
export const asHtml = (text: string): string =>
	text
		.split(/\n{2,}/)
		.map((paragraph) => `<p>${paragraph.split('\n').map(htmlLine).join('<br>')}</p>`)
		.join('\n');

function htmlLine(line: string): string {
	const shown = escaped(line);
	return /^https?:\/\/\S+$/.test(line) ? `<a href="${shown}">${shown}</a>` : shown;
}
