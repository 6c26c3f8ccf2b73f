import { hashPassword, passwordFits } from '../access/password.ts';
import { database, inTransaction } from '../database/connection.ts';
import { deleteOtherSessions } from '../repositories/sessions.repository.ts';
import {
	findPasswordHash,
	listAccounts,
	renameUser,
	setPasswordHash,
} from '../repositories/users.repository.ts';
import { limits, use } from './limits.service.ts';
import { Refused } from './outcomes.ts';

/** What a person's own page shows about the ways in. */
export async function waysIn(userId: string) {
	const db = database();
	const [hash, accounts] = await Promise.all([
		findPasswordHash(db, userId),
		listAccounts(db, userId),
	]);
	return { hasPassword: hash !== null, providers: accounts.map(({ provider }) => provider) };
}

export const changeName = (userId: string, name: string): Promise<void> =>
	renameUser(database(), userId, name);

/**
 * Sets a new password and signs this person out everywhere else.
 * @param current needed where there is a password already
 */
export async function changePassword(
	userId: string,
	currentSession: string,
	current: string,
	next: string,
): Promise<void> {
	await use(limits.passwordByPerson, userId);
	const kept = await findPasswordHash(database(), userId);
	if (kept && !(await passwordFits(kept, current))) {
		throw new Refused('This is not your present password.', 'current');
	}
	const hash = await hashPassword(next);
	await inTransaction(async (trx) => {
		await setPasswordHash(trx, userId, hash);
		await deleteOtherSessions(trx, userId, currentSession);
	});
}
