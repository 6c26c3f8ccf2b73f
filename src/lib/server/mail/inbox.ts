import { existsSync } from 'node:fs';
import { readFile, readdir } from 'node:fs/promises';
import path from 'node:path';
import { config } from '../config.ts';

/** A message that the demo caught instead of sending it. */
export interface CaughtMail {
	/** begins with the milliseconds of its arrival, so that names sort by time */
	id: string;
	at: string;
	to: string[];
	subject: string;
	text: string;
}

export const caughtMailDirectory = (): string => path.join(config().dataDirectory, 'mail');

/** The newest messages first. */
export async function readCaughtMail(limit = 50): Promise<CaughtMail[]> {
	const directory = caughtMailDirectory();
	if (!existsSync(directory)) return [];
	const names = (await readdir(directory)).filter((name) => name.endsWith('.json'));
	const newest = names.sort().reverse().slice(0, limit);
	return Promise.all(
		newest.map(async (name) => JSON.parse(await readFile(path.join(directory, name), 'utf8'))),
	);
}
