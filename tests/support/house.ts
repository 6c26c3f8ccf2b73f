import { disconnect, type Db } from '../../src/lib/server/database/connection.ts';
import type { Member } from '../../src/lib/server/access/member.ts';
import type { Role } from '../../src/lib/server/access/roles.ts';
import { insertMember } from '../../src/lib/server/repositories/members.repository.ts';
import { insertUser } from '../../src/lib/server/repositories/users.repository.ts';
import { createTeam, membership } from '../../src/lib/server/services/teams.service.ts';
import { createDatabase } from './database.ts';
import { openMailbox } from './mailbox.ts';

/** The services as the product runs them, on a database and a mail server of one test file's own. */
export async function openHouse() {
	const database = await createDatabase();
	const mailbox = await openMailbox();
	Object.assign(process.env, {
		MERESTONE_TEST_SERVER: process.env.MERESTONE_TEST_SERVER ?? process.env.DATABASE_URL,
		DATABASE_URL: database.url,
		AUTH_SECRET: 'a secret for tests only, of enough length',
		ORIGIN: 'https://maps.example',
		SMTP_URL: mailbox.url,
	});
	return {
		db: database.db,
		mailbox,
		async close() {
			await disconnect();
			await database.drop();
			await mailbox.close();
		},
	};
}

let people = 0;

/** A person whom no other test knows. */
export const newPerson = (db: Db, name = 'Someone') =>
	insertUser(db, `person-${(people += 1)}@people.example`, name);

/** A new team with an admin. */
export async function newTeam(db: Db, name = 'Survey') {
	const person = await newPerson(db, 'Admin');
	const team = await createTeam(person.id, name);
	return { team, admin: await memberOf(team.slug, person.id) };
}

/** Another member of the team, with these roles. */
export async function join(db: Db, team: { id: string; slug: string }, ...roles: Role[]) {
	const person = await newPerson(db, roles.join(' and '));
	await insertMember(db, team.id, person.id, roles);
	return memberOf(team.slug, person.id);
}

async function memberOf(slug: string, userId: string): Promise<Member & { userId: string }> {
	const member = await membership(slug, userId);
	if (!member) throw new Error('the person is no member');
	return { ...member, userId };
}
