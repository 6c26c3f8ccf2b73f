import { hashPassword, passwordFits } from '../lib/server/access/password.ts';
import type { Member } from '../lib/server/access/member.ts';
import type { Role } from '../lib/server/access/roles.ts';
import { scopes } from '../lib/server/access/scopes.ts';
import { inTransaction, type Db } from '../lib/server/database/connection.ts';
import { insertMember, setRoles } from '../lib/server/repositories/members.repository.ts';
import { findTeam, insertTeam, type TeamRow } from '../lib/server/repositories/teams.repository.ts';
import {
	findPasswordHash,
	findUserByEmail,
	insertUser,
	setPasswordHash,
} from '../lib/server/repositories/users.repository.ts';
import { record } from '../lib/server/services/activity.service.ts';
import { demoTeam } from '../lib/server/services/demo-mail.service.ts';
import { membership } from '../lib/server/services/teams.service.ts';
import { createToken, memberForToken } from '../lib/server/services/tokens.service.ts';
import { randomSecret } from './files.mjs';

/** The demo's people: invented, one person for each role and one who does several jobs. */

const people: { name: string; roles: Role[] }[] = [
	{ name: 'Ines Marrow', roles: ['cartographer'] },
	{ name: 'Anders Quill', roles: ['analyst'] },
	{ name: 'Petra Lund', roles: ['planner'] },
	{ name: 'Dario Fenn', roles: ['designer'] },
	{ name: 'Agnes Holt', roles: ['approver'] },
	{ name: 'Marit Aldane', roles: ['admin'] },
	{ name: 'Sol Verity', roles: ['cartographer', 'analyst', 'approver'] },
];

export interface DemoSignIns {
	token: string;
	users: { email: string; password: string; roles: Role[] }[];
}

/**
 * Safe to run at every start: passwords and token of an earlier start stay, and what is written down works.
 * @param kept what an earlier start has written down
 */
export async function seedDemoTeam(kept: Partial<DemoSignIns> | null): Promise<DemoSignIns> {
	const users = people.map(({ name, roles: held }) => {
		const email = `${held.length === 1 ? held[0] : 'several'}@${demoTeam.slug}.example`;
		const password = kept?.users?.find((user) => user.email === email)?.password;
		return { name, email, password: password ?? randomSecret(12), roles: held };
	});
	await inTransaction(async (trx) => {
		const team = await ensureTeam(trx);
		for (const user of users) await ensureMember(trx, team, user);
	});
	const token = await ensureToken(kept?.token);
	return { token, users: users.map(({ email, password, roles }) => ({ email, password, roles })) };
}

async function ensureTeam(trx: Db): Promise<TeamRow> {
	const made = await insertTeam(trx, demoTeam.slug, demoTeam.name);
	const team = made ?? (await findTeam(trx, demoTeam.slug));
	if (!team) throw new Error('the demo team was neither made nor found');
	if (made) {
		const subject = { kind: 'team', id: team.id };
		await record(trx, { team, userId: null, tokenId: null }, 'team.created', subject, {
			name: team.name,
		});
	}
	return team;
}

async function ensureMember(
	trx: Db,
	team: TeamRow,
	person: { name: string; email: string; password: string; roles: Role[] },
): Promise<void> {
	const { name, email, password } = person;
	const user = (await findUserByEmail(trx, email)) ?? (await insertUser(trx, email, name));
	if (!(await passwordFits(await findPasswordHash(trx, user.id), password))) {
		await setPasswordHash(trx, user.id, await hashPassword(password));
	}
	if (!(await insertMember(trx, team.id, user.id, person.roles))) {
		await setRoles(trx, team.id, user.id, person.roles);
	}
}

/** A token that works: the kept one, or a new one made by the demo's admin. */
async function ensureToken(kept: string | undefined): Promise<string> {
	if (kept && (await memberForToken(kept))) return kept;
	return createToken(await demoMember('admin'), { name: 'Demo', scopes, days: 365 });
}

/** One of the demo's people, by the part of their address before the @. */
export async function demoMember(name: string): Promise<Member> {
	const email = `${name}@${demoTeam.slug}.example`;
	const user = await inTransaction((trx) => findUserByEmail(trx, email));
	const member = user && (await membership(demoTeam.slug, user.id));
	if (!member) throw new Error(`the demo team has no ${name}`);
	return member;
}
