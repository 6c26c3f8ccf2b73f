import type { Db } from '../database/connection.ts';
import type { Row } from '../database/schema.ts';

export type TeamRow = Row<'teams'>;

/** @returns undefined when another team has this slug */
export const insertTeam = (db: Db, slug: string, name: string): Promise<TeamRow | undefined> =>
	db
		.insertInto('teams')
		.values({ slug, name })
		.onConflict((oc) => oc.column('slug').doNothing())
		.returningAll()
		.executeTakeFirst();

export const findTeam = (db: Db, slug: string): Promise<TeamRow | undefined> =>
	db.selectFrom('teams').selectAll().where('slug', '=', slug).executeTakeFirst();

export const findTeamById = (db: Db, id: string): Promise<TeamRow | undefined> =>
	db.selectFrom('teams').selectAll().where('id', '=', id).executeTakeFirst();

export async function renameTeam(db: Db, teamId: string, name: string): Promise<void> {
	await db.updateTable('teams').set({ name }).where('id', '=', teamId).execute();
}

/** The teams that this person is in, by name. */
export const listTeamsOf = (db: Db, userId: string) =>
	db
		.selectFrom('members')
		.innerJoin('teams', 'teams.id', 'members.team_id')
		.select(['teams.id', 'teams.slug', 'teams.name', 'members.roles'])
		.where('members.user_id', '=', userId)
		.orderBy('teams.name')
		.execute();

/** This person's place in the team of this slug. */
export const findMembership = (db: Db, slug: string, userId: string) =>
	db
		.selectFrom('members')
		.innerJoin('teams', 'teams.id', 'members.team_id')
		.select(['teams.id', 'teams.slug', 'teams.name', 'members.roles'])
		.where('teams.slug', '=', slug)
		.where('members.user_id', '=', userId)
		.executeTakeFirst();
