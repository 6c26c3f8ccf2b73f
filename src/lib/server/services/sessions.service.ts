import { newSecret } from '../access/secret.ts';
import { database, type Db } from '../database/connection.ts';
import {
	deleteOtherSessions,
	deleteSession,
	insertSession,
	listSessions,
} from '../repositories/sessions.repository.ts';

/** How long a sign-in lasts without use, and how old it may grow before use renews it. */
export const SESSION_SECONDS = 14 * 24 * 3600;
export const SESSION_RENEWAL_SECONDS = 24 * 3600;

export interface OpenedSession {
	token: string;
	expires: Date;
}

/** Signs this person in: the row that Auth.js looks up by the cookie's value. */
export async function openSession(userId: string, db: Db = database()): Promise<OpenedSession> {
	const token = newSecret();
	const expires = new Date(Date.now() + SESSION_SECONDS * 1000);
	await insertSession(db, { userId, sessionToken: token, expires });
	return { token, expires };
}

export const endSession = (token: string): Promise<void> => deleteSession(database(), token);

/** Signs this person out everywhere but here. @returns how many sign-ins were ended */
export const endOtherSessions = (userId: string, keptToken: string): Promise<number> =>
	deleteOtherSessions(database(), userId, keptToken);

/** Where this person is signed in, without the secrets of those sessions. */
export async function sessionsOf(userId: string, currentToken: string) {
	const rows = await listSessions(database(), userId);
	return rows.map(({ id, sessionToken, created_at, expires }) => ({
		id,
		since: created_at,
		until: expires,
		current: sessionToken === currentToken,
	}));
}
