import path from 'node:path';
import { z } from 'zod';

/** Where uploaded and issued bytes are kept. */
const filesEnvironment = {
	MERESTONE_DATA: z.string().default('.data'),
	MERESTONE_FILES: z.enum(['folder', 's3']).default('folder'),
	MERESTONE_S3_ENDPOINT: z.url({ protocol: /^https?$/ }).optional(),
	MERESTONE_S3_BUCKET: z
		.string()
		.regex(
			/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/,
			'a bucket has 3 to 63 small letters, digits, - or .',
		)
		.optional(),
	MERESTONE_S3_REGION: z.string().min(1).max(60).default('us-east-1'),
	/** 1: the bucket stands in the path of the address, 0: in the name of the host */
	MERESTONE_S3_PATH_STYLE: z.enum(['0', '1']).default('1'),
	MERESTONE_S3_KEY_ID: z.string().optional(),
	MERESTONE_S3_SECRET: z.string().optional(),
};

export interface S3Settings {
	endpoint: string;
	bucket: string;
	region: string;
	pathStyle: boolean;
	keyId: string;
	secret: string;
}

export interface FilesConfig {
	dataDirectory: string;
	/** null: a folder of the data directory */
	s3: S3Settings | null;
}

/** What the environment tells the processes. Read on first use, because the build loads server modules too. */
const environment = z.object({
	DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
	ORIGIN: z.url().default('http://localhost:4600'),
	AUTH_SECRET: z.string().min(32),
	MERESTONE_DEMO: z.enum(['0', '1']).default('0'),
	SMTP_URL: z.string().optional(),
	MAIL_FROM: z.string().default('Merestone <merestone@localhost>'),
	...filesEnvironment,
	OIDC_ISSUER: z.string().optional(),
	OIDC_ID: z.string().optional(),
	OIDC_SECRET: z.string().optional(),
	OIDC_NAME: z.string().default('your organisation'),
});

const blankless = (env: NodeJS.ProcessEnv) =>
	Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ''));

/** The part about files, which the jobs' tests read without the rest. */
export function readFilesConfig(env: NodeJS.ProcessEnv): FilesConfig {
	const read = z.object(filesEnvironment).parse(blankless(env));
	const dataDirectory = path.resolve(read.MERESTONE_DATA);
	if (read.MERESTONE_FILES === 'folder') return { dataDirectory, s3: null };
	const asked = z.object({
		MERESTONE_S3_ENDPOINT: z.string('MERESTONE_FILES=s3 needs MERESTONE_S3_ENDPOINT'),
		MERESTONE_S3_BUCKET: z.string('MERESTONE_FILES=s3 needs MERESTONE_S3_BUCKET'),
		MERESTONE_S3_KEY_ID: z.string('MERESTONE_FILES=s3 needs MERESTONE_S3_KEY_ID'),
		MERESTONE_S3_SECRET: z.string('MERESTONE_FILES=s3 needs MERESTONE_S3_SECRET'),
	});
	const given = asked.parse(read);
	return {
		dataDirectory,
		s3: {
			endpoint: given.MERESTONE_S3_ENDPOINT,
			bucket: given.MERESTONE_S3_BUCKET,
			region: read.MERESTONE_S3_REGION,
			pathStyle: read.MERESTONE_S3_PATH_STYLE === '1',
			keyId: given.MERESTONE_S3_KEY_ID,
			secret: given.MERESTONE_S3_SECRET,
		},
	};
}

export interface Config {
	databaseUrl: string;
	origin: string;
	authSecret: string;
	dataDirectory: string;
	files: FilesConfig;
	/** shows the inbox of caught mails and the demo sign-ins; never set in production */
	demo: boolean;
	/** null: no mails can be sent, so links by mail are not offered */
	mail: { server: string; from: string } | null;
	oidc: { issuer: string; clientId: string; clientSecret: string; name: string } | null;
}

let known: Config | null = null;

export const config = (): Config => (known ??= readConfig(process.env));

export function readConfig(env: NodeJS.ProcessEnv): Config {
	const read = environment.parse(blankless(env));
	const { OIDC_ISSUER: issuer, OIDC_ID: clientId, OIDC_SECRET: clientSecret } = read;
	return {
		databaseUrl: read.DATABASE_URL,
		origin: new URL(read.ORIGIN).origin,
		authSecret: read.AUTH_SECRET,
		dataDirectory: path.resolve(read.MERESTONE_DATA),
		files: readFilesConfig(env),
		demo: read.MERESTONE_DEMO === '1',
		mail: read.SMTP_URL ? { server: read.SMTP_URL, from: read.MAIL_FROM } : null,
		oidc:
			issuer && clientId && clientSecret
				? { issuer, clientId, clientSecret, name: read.OIDC_NAME }
				: null,
	};
}
