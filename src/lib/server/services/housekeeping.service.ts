import { database } from '../database/connection.ts';
import { log } from '../log.ts';
import { removeOldUses } from '../repositories/limits.repository.ts';
import { removeExpired } from '../repositories/sessions.repository.ts';

const EVERY_MINUTES = 15;

/** Removes what has run out: sessions, mailed links, counts of uses. */
export async function tidy(): Promise<void> {
	await removeExpired(database());
	await removeOldUses(database());
}

/** Tidies now and then. @returns ends it */
export function startHousekeeping(): () => void {
	const run = () =>
		tidy().catch((error: unknown) => log.warn({ error: String(error) }, 'tidying failed'));
	const timer = setInterval(run, EVERY_MINUTES * 60_000);
	void run();
	return () => clearInterval(timer);
}
