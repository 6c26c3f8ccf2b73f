import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow } from '../database/schema.ts';

export const insertToken = (db: Db, token: NewRow<'api_tokens'>) =>
	db.insertInto('api_tokens').values(token).returning('id').executeTakeFirstOrThrow();

/** All tokens of a team, those that still work first. */
export const listTokens = (db: Db, teamId: string) =>
	db
		.selectFrom('api_tokens')
		.select(['id', 'name', 'hint', 'scopes', 'created_at', 'expires_at'])
		.select(['revoked_at', 'last_used_at'])
		.where('team_id', '=', teamId)
		.orderBy(sql`revoked_at is not null or expires_at < now()`)
		.orderBy('created_at', 'desc')
		.execute();

/** The token with this hash, if it works, with its team. */
export const findLiveToken = (db: Db, hash: Buffer) =>
	db
		.selectFrom('api_tokens')
		.innerJoin('teams', 'teams.id', 'api_tokens.team_id')
		.select(['api_tokens.id', 'scopes', 'team_id', 'teams.slug', 'teams.name as teamName'])
		.where('hash', '=', hash)
		.where('revoked_at', 'is', null)
		.where('expires_at', '>', sql<Date>`now()`)
		.executeTakeFirst();

/** Notes the use, at most once a minute. */
export async function touchToken(db: Db, id: string): Promise<void> {
	await db
		.updateTable('api_tokens')
		.set({ last_used_at: sql<Date>`now()` })
		.where('id', '=', id)
		.where((eb) =>
			eb.or([
				eb('last_used_at', 'is', null),
				eb('last_used_at', '<', sql<Date>`now() - interval '1 minute'`),
			]),
		)
		.execute();
}

/** @returns its name, or undefined when the team has no such token in use */
export const revokeToken = (db: Db, teamId: string, id: string) =>
	db
		.updateTable('api_tokens')
		.set({ revoked_at: new Date() })
		.where('id', '=', id)
		.where('team_id', '=', teamId)
		.where('revoked_at', 'is', null)
		.returning('name')
		.executeTakeFirst();
