import type { AddressInfo } from 'node:net';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

export interface ReceivedMail {
	to: string[];
	subject: string;
	text: string;
	html: string;
}

/** A mail server on loopback that keeps what it is sent, for tests to read. */
export async function openMailbox() {
	const mails: ReceivedMail[] = [];
	const server = new SMTPServer({
		authOptional: true,
		disabledCommands: ['STARTTLS'],
		onData(stream, session, callback) {
			simpleParser(stream).then((mail) => {
				mails.push({
					to: session.envelope.rcptTo.map(({ address }) => address),
					subject: mail.subject ?? '',
					text: mail.text ?? '',
					html: mail.html || '',
				});
				callback();
			}, callback);
		},
	});
	await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
	const { port } = server.server.address() as AddressInfo;
	return {
		url: `smtp://127.0.0.1:${port}`,
		mails,
		/** the first address in the newest mail to this person */
		linkTo(person: string): string {
			const mail = mails.findLast(({ to }) => to.includes(person));
			const link = mail?.text.match(/https?:\/\/\S+/)?.[0];
			if (!link) throw new Error(`no mail with a link for ${person}`);
			return link;
		},
		close: () => new Promise<void>((resolve) => server.close(() => resolve())),
	};
}
