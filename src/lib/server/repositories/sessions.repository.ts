import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';

export async function insertSession(
	db: Db,
	session: { userId: string; sessionToken: string; expires: Date },
): Promise<void> {
	await db.insertInto('Session').values(session).execute();
}

/** The sessions that still run, the latest first. */
export const listSessions = (db: Db, userId: string) =>
	db
		.selectFrom('Session')
		.select(['id', 'sessionToken', 'created_at', 'expires'])
		.where('userId', '=', userId)
		.where('expires', '>', sql<Date>`now()`)
		.orderBy('created_at', 'desc')
		.execute();

/** @returns how many were ended */
export async function deleteOtherSessions(
	db: Db,
	userId: string,
	keptToken: string,
): Promise<number> {
	const { numDeletedRows } = await db
		.deleteFrom('Session')
		.where('userId', '=', userId)
		.where('sessionToken', '!=', keptToken)
		.executeTakeFirst();
	return Number(numDeletedRows);
}

export async function deleteSession(db: Db, sessionToken: string): Promise<void> {
	await db.deleteFrom('Session').where('sessionToken', '=', sessionToken).execute();
}

export async function removeExpired(db: Db): Promise<void> {
	await db
		.deleteFrom('Session')
		.where('expires', '<', sql<Date>`now()`)
		.execute();
	await db
		.deleteFrom('VerificationToken')
		.where('expires', '<', sql<Date>`now()`)
		.execute();
}
