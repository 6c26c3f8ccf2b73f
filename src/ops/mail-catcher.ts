import { mkdirSync, renameSync, writeFileSync } from 'node:fs';
import { randomUUID } from 'node:crypto';
import path from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { config } from '../lib/server/config.ts';
import { log } from '../lib/server/log.ts';
import { caughtMailDirectory, type CaughtMail } from '../lib/server/mail/inbox.ts';

/** Demo mode's mail server: takes every message on loopback and keeps it as a file; sends nothing on. */
const directory = caughtMailDirectory();
mkdirSync(directory, { recursive: true, mode: 0o700 });

const server = new SMTPServer({
	authOptional: true,
	disabledCommands: ['STARTTLS'],
	size: 1024 * 1024,
	onData(stream, session, callback) {
		const recipients = session.envelope.rcptTo.map((recipient) => recipient.address);
		simpleParser(stream)
			.then((mail) =>
				keep({
					id: `${Date.now()}-${randomUUID()}`,
					at: new Date().toISOString(),
					to: recipients,
					subject: mail.subject ?? '',
					text: mail.text ?? '',
				}),
			)
			.then(() => callback(), callback);
	},
});

function keep(mail: CaughtMail): void {
	const file = path.join(directory, `${mail.id}.json`);
	writeFileSync(`${file}.part`, JSON.stringify(mail), { mode: 0o600 });
	renameSync(`${file}.part`, file);
}

const { port } = new URL(config().mail?.server ?? '');
server.on('error', (error) => log.error({ error: error.message }, 'the mail catcher failed'));
server.listen(Number(port), '127.0.0.1');
process.once('SIGTERM', () => server.close(() => process.exit(0)));
