import path from 'node:path';
import { z } from 'zod';

/** What the environment tells the processes. Read on first use, because the build loads server modules too. */
const environment = z.object({
	DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
	ORIGIN: z.url().default('http://localhost:4600'),
	AUTH_SECRET: z.string().min(32),
	MERESTONE_DATA: z.string().default('.data'),
	MERESTONE_DEMO: z.enum(['0', '1']).default('0'),
	SMTP_URL: z.string().optional(),
	MAIL_FROM: z.string().default('Merestone <merestone@localhost>'),
	OIDC_ISSUER: z.string().optional(),
	OIDC_ID: z.string().optional(),
	OIDC_SECRET: z.string().optional(),
	OIDC_NAME: z.string().default('your organisation'),
});

export interface Config {
	databaseUrl: string;
	origin: string;
	authSecret: string;
	dataDirectory: string;
	/** shows the inbox of caught mails and the demo sign-ins; never set in production */
	demo: boolean;
	/** null: no mails can be sent, so links by mail are not offered */
	mail: { server: string; from: string } | null;
	oidc: { issuer: string; clientId: string; clientSecret: string; name: string } | null;
}

let known: Config | null = null;

export const config = (): Config => (known ??= readConfig(process.env));

export function readConfig(env: NodeJS.ProcessEnv): Config {
	const blankless = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ''));
	const read = environment.parse(blankless);
	const { OIDC_ISSUER: issuer, OIDC_ID: clientId, OIDC_SECRET: clientSecret } = read;
	return {
		databaseUrl: read.DATABASE_URL,
		origin: new URL(read.ORIGIN).origin,
		authSecret: read.AUTH_SECRET,
		dataDirectory: path.resolve(read.MERESTONE_DATA),
		demo: read.MERESTONE_DEMO === '1',
		mail: read.SMTP_URL ? { server: read.SMTP_URL, from: read.MAIL_FROM } : null,
		oidc:
			issuer && clientId && clientSecret
				? { issuer, clientId, clientSecret, name: read.OIDC_NAME }
				: null,
	};
}
