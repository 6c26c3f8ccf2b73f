import { requireAccess, type Member } from '../access/member.ts';
import { slugFor } from '../access/reserved.ts';
import { roles, type Role } from '../access/roles.ts';
import { database, inTransaction, type Db } from '../database/connection.ts';
import { insertMember } from '../repositories/members.repository.ts';
import {
	findMembership,
	insertTeam,
	listTeamsOf,
	renameTeam,
	type TeamRow,
} from '../repositories/teams.repository.ts';
import { record } from './activity.service.ts';
import { limits, use } from './limits.service.ts';

/** What the database holds, without words that are no roles (any more). */
export const knownRoles = (words: readonly string[]): Role[] =>
	roles.filter((role) => words.includes(role));

/** The teams that this person is in. */
export async function teamsOf(userId: string) {
	const rows = await listTeamsOf(database(), userId);
	return rows.map((row) => ({ ...row, roles: knownRoles(row.roles) }));
}

/** This person as a member of the team of this slug, or null when there is no such team for them. */
export async function membership(slug: string, userId: string): Promise<Member | null> {
	const row = await findMembership(database(), slug, userId);
	if (!row) return null;
	const team = { id: row.id, slug: row.slug, name: row.name };
	return { team, userId, tokenId: null, roles: knownRoles(row.roles), actions: null };
}

/** Makes a team whose first member and admin is this person. Anyone who is signed in may. */
export async function createTeam(userId: string, name: string): Promise<TeamRow> {
	await use(limits.teamsByPerson, userId);
	return inTransaction(async (trx) => {
		const team = await insertUnderFreeSlug(trx, name);
		await insertMember(trx, team.id, userId, ['admin']);
		const actor = { team, userId, tokenId: null };
		await record(trx, actor, 'team.created', { kind: 'team', id: team.id }, { name });
		return team;
	});
}

export async function insertUnderFreeSlug(trx: Db, name: string): Promise<TeamRow> {
	for (let place = 1; ; place += 1) {
		const team = await insertTeam(trx, slugFor(name, place), name);
		if (team) return team;
	}
}

/** Gives the team another name; its address stays, so that links hold. */
export async function changeTeamName(member: Member, name: string): Promise<void> {
	requireAccess(member, 'team.manage');
	await inTransaction(async (trx) => {
		await renameTeam(trx, member.team.id, name);
		const detail = { from: member.team.name, to: name };
		await record(trx, member, 'team.renamed', { kind: 'team', id: member.team.id }, detail);
	});
}
