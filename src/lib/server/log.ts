import pino from 'pino';

/** One line of JSON for each event. Secrets have no place in it: known names are struck out even so. */
export const log = pino({
	level: process.env.LOG_LEVEL ?? 'info',
	base: { process: process.env.MERESTONE_PROCESS ?? 'web' },
	redact: {
		paths: ['password', 'token', 'cookie', 'authorization', 'secret', '*.password', '*.token'],
		censor: '[struck out]',
	},
});
