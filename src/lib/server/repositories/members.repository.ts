import type { Db } from '../database/connection.ts';

/** @returns false when this person is in the team already */
export async function insertMember(
	db: Db,
	teamId: string,
	userId: string,
	roles: readonly string[],
): Promise<boolean> {
	const row = await db
		.insertInto('members')
		.values({ team_id: teamId, user_id: userId, roles: [...roles] })
		.onConflict((oc) => oc.columns(['team_id', 'user_id']).doNothing())
		.returning('user_id')
		.executeTakeFirst();
	return row !== undefined;
}

export const listMembers = (db: Db, teamId: string) =>
	db
		.selectFrom('members')
		.innerJoin('User', 'User.id', 'members.user_id')
		.select(['User.id', 'User.name', 'User.email', 'members.roles', 'members.joined_at'])
		.where('members.team_id', '=', teamId)
		.orderBy('User.name')
		.orderBy('User.email')
		.execute();

/** Holds every other change to this team's members until the transaction ends. */
export const lockMembers = (trx: Db, teamId: string) =>
	trx
		.selectFrom('members')
		.select(['user_id', 'roles'])
		.where('team_id', '=', teamId)
		.orderBy('user_id')
		.forUpdate()
		.execute();

export async function setRoles(
	db: Db,
	teamId: string,
	userId: string,
	roles: readonly string[],
): Promise<void> {
	await db
		.updateTable('members')
		.set({ roles: [...roles] })
		.where('team_id', '=', teamId)
		.where('user_id', '=', userId)
		.execute();
}

export async function deleteMember(db: Db, teamId: string, userId: string): Promise<void> {
	await db
		.deleteFrom('members')
		.where('team_id', '=', teamId)
		.where('user_id', '=', userId)
		.execute();
}
