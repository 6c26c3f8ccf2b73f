import { sql } from 'kysely';
import type { Db } from '../database/connection.ts';
import type { NewRow } from '../database/schema.ts';

export const insertInvitation = (db: Db, invitation: NewRow<'invitations'>) =>
	db.insertInto('invitations').values(invitation).returning('id').executeTakeFirstOrThrow();

const open = (db: Db) =>
	db
		.selectFrom('invitations')
		.where('accepted_at', 'is', null)
		.where('revoked_at', 'is', null)
		.where('expires_at', '>', sql<Date>`now()`);

/** The invitations of a team that can still be accepted, the latest first. */
export const listOpenInvitations = (db: Db, teamId: string) =>
	open(db)
		.select(['id', 'email', 'roles', 'created_at', 'expires_at'])
		.where('team_id', '=', teamId)
		.orderBy('created_at', 'desc')
		.execute();

/** The open invitation behind a link, with its team; `lock` keeps a second acceptance waiting. */
export function findOpenInvitation(db: Db, tokenHash: Buffer, lock = false) {
	const query = open(db)
		.innerJoin('teams', 'teams.id', 'invitations.team_id')
		.select(['invitations.id', 'email', 'roles', 'expires_at', 'team_id'])
		.select(['teams.slug', 'teams.name as teamName'])
		.where('token_hash', '=', tokenHash);
	return (lock ? query.forUpdate('invitations') : query).executeTakeFirst();
}

export async function markAccepted(db: Db, id: string): Promise<void> {
	await db
		.updateTable('invitations')
		.set({ accepted_at: new Date() })
		.where('id', '=', id)
		.execute();
}

/** @returns the address it was sent to, or undefined when there was no open one of this id */
export const revokeInvitation = (db: Db, teamId: string, id: string) =>
	db
		.updateTable('invitations')
		.set({ revoked_at: new Date() })
		.where('id', '=', id)
		.where('team_id', '=', teamId)
		.where('accepted_at', 'is', null)
		.where('revoked_at', 'is', null)
		.returning('email')
		.executeTakeFirst();

/** A new invitation takes the place of earlier ones to the same address. */
export async function revokeEarlier(db: Db, teamId: string, email: string): Promise<void> {
	await db
		.updateTable('invitations')
		.set({ revoked_at: new Date() })
		.where('team_id', '=', teamId)
		.where('email', '=', email)
		.where('accepted_at', 'is', null)
		.where('revoked_at', 'is', null)
		.execute();
}
