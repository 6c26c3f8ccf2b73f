import { database, type Db } from '../database/connection.ts';
import { fileStore, type FileStore } from '../files/index.ts';
import { log } from '../log.ts';
import { removeOldUses } from '../repositories/limits.repository.ts';
import { removeExpired } from '../repositories/sessions.repository.ts';
import { endExpiredExports } from './export-end.service.ts';
import { daysToAnswer, endUnanswered } from './intake-answer.service.ts';
import { endUnansweredRecuts } from './recut-work.service.ts';

const EVERY_MINUTES = 15;

/** Removes what has run out: sessions, mailed links, counts of uses, files that nobody answers for. */
export async function tidy(db: Db = database(), files: FileStore = fileStore()): Promise<void> {
	await removeExpired(db);
	await removeOldUses(db);
	await endUnanswered(db, files);
	await endUnansweredRecuts(db, files, daysToAnswer);
	await endExpiredExports(db, files);
}

/** Tidies now and then. @returns ends it */
export function startHousekeeping(): () => void {
	const run = () =>
		tidy().catch((error: unknown) => log.warn({ error: String(error) }, 'tidying failed'));
	const timer = setInterval(run, EVERY_MINUTES * 60_000);
	void run();
	return () => clearInterval(timer);
}
