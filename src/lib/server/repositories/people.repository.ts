import type { Db } from '../database/connection.ts';

/** Name and address of a person, or the name of an API token. */
export async function findPerson(
	db: Db,
	userId: string | null,
	tokenId: string | null,
): Promise<{ by_name: string | null; by_email: string | null } | undefined> {
	if (userId) {
		return db
			.selectFrom('User')
			.select(['name as by_name', 'email as by_email'])
			.where('id', '=', userId)
			.executeTakeFirst();
	}
	if (!tokenId) return undefined;
	const token = await db
		.selectFrom('api_tokens')
		.select('name')
		.where('id', '=', tokenId)
		.executeTakeFirst();
	return token && { by_name: token.name, by_email: null };
}
