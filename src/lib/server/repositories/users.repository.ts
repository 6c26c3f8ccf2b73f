import type { Db } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';

export type UserRow = Row<'User'>;

export const findUserByEmail = (db: Db, email: string): Promise<UserRow | undefined> =>
	db.selectFrom('User').selectAll().where('email', '=', email).executeTakeFirst();

/** The person with this address and the hash of the password, null where none is set. */
export const findSignIn = (db: Db, email: string) =>
	db
		.selectFrom('User')
		.leftJoin('passwords', 'passwords.user_id', 'User.id')
		.select(['User.id', 'passwords.hash'])
		.where('User.email', '=', email)
		.executeTakeFirst();

/** A person whose address has been proved, by a mail that reached it. */
export const insertUser = (db: Db, email: string, name: string): Promise<UserRow> =>
	db
		.insertInto('User')
		.values({ email, name, image: null, emailVerified: new Date() })
		.returningAll()
		.executeTakeFirstOrThrow();

export async function renameUser(db: Db, userId: string, name: string): Promise<void> {
	await db.updateTable('User').set({ name }).where('id', '=', userId).execute();
}

export async function findPasswordHash(db: Db, userId: string): Promise<string | null> {
	const row = await db
		.selectFrom('passwords')
		.select('hash')
		.where('user_id', '=', userId)
		.executeTakeFirst();
	return row?.hash ?? null;
}

export async function setPasswordHash(db: Db, userId: string, hash: string): Promise<void> {
	await db
		.insertInto('passwords')
		.values({ user_id: userId, hash })
		.onConflict((oc) => oc.column('user_id').doUpdateSet({ hash, changed_at: new Date() }))
		.execute();
}

/** The outside sign-ins that are tied to this person. */
export const listAccounts = (db: Db, userId: string) =>
	db.selectFrom('Account').select(['provider']).where('userId', '=', userId).execute();
