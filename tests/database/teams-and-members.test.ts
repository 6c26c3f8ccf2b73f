import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readActivity } from '../../src/lib/server/services/activity.service.ts';
import {
	changeRoles,
	leaveTeam,
	readMembers,
	removeMember,
} from '../../src/lib/server/services/members.service.ts';
import {
	changeTeamName,
	createTeam,
	membership,
	teamsOf,
} from '../../src/lib/server/services/teams.service.ts';
import { join, newPerson, newTeam, openHouse } from '../support/house.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
beforeAll(async () => {
	house = await openHouse();
});
afterAll(() => house.close());

const everything = { kind: null, userId: null };

describe('teams', () => {
	it('make their first member admin and stand under an address of their own', async () => {
		const person = await newPerson(house.db);
		const first = await createTeam(person.id, 'Land Survey');
		const second = await createTeam(person.id, 'Land Survey');
		expect([first.slug, second.slug]).toEqual(['land-survey', 'land-survey-2']);
		expect(await teamsOf(person.id)).toMatchObject([{ roles: ['admin'] }, { roles: ['admin'] }]);
	});

	it('never take an address of the product, and find one for any name', async () => {
		const person = await newPerson(house.db);
		const names = ['Teams', 'API', '<script>', '測量局', 'Å', "'; drop table teams; --"];
		for (const name of names) {
			const team = await createTeam(person.id, name);
			expect(team.slug).toMatch(/^[a-z0-9][a-z0-9-]{1,48}$/);
			expect(['teams', 'api']).not.toContain(team.slug);
			expect(team.name).toBe(name);
		}
	});

	it('find different addresses when made at the same moment', async () => {
		const person = await newPerson(house.db);
		const teams = await Promise.all(Array.from({ length: 6 }, () => createTeam(person.id, 'Same')));
		expect(new Set(teams.map(({ slug }) => slug)).size).toBe(6);
	});

	it('keep their address when they change their name', async () => {
		const { team, admin } = await newTeam(house.db, 'Old name');
		await changeTeamName(admin, 'New name');
		expect(await membership(team.slug, admin.userId)).toMatchObject({
			team: { slug: team.slug, name: 'New name' },
		});
	});

	it('do not exist for those who are not in them', async () => {
		const { team } = await newTeam(house.db);
		const stranger = await newPerson(house.db);
		expect(await membership(team.slug, stranger.id)).toBeNull();
		expect(await membership('no-such-team', stranger.id)).toBeNull();
	});
});

describe('members', () => {
	it('have their roles changed, which the log remembers', async () => {
		const { team, admin } = await newTeam(house.db);
		const member = await join(house.db, team, 'designer');
		await changeRoles(admin, member.userId, ['planner', 'analyst']);
		expect(await membership(team.slug, member.userId)).toMatchObject({
			roles: ['analyst', 'planner'],
		});
		const { entries } = await readActivity(admin, everything, 1);
		expect(entries[0]).toMatchObject({
			action: 'member.roles-changed',
			subject_id: member.userId,
			detail: { from: ['designer'], to: ['planner', 'analyst'] },
		});
	});

	it('of another team cannot be reached', async () => {
		const { admin } = await newTeam(house.db);
		const other = await newTeam(house.db);
		await expect(removeMember(admin, other.admin.userId)).rejects.toThrow('no such member');
		await expect(changeRoles(admin, other.admin.userId, ['designer'])).rejects.toThrow(
			'no such member',
		);
		expect(await readMembers(other.admin)).toHaveLength(1);
	});

	it('keep at least one admin, however it is tried', async () => {
		const { team, admin } = await newTeam(house.db);
		const tries = [
			() => changeRoles(admin, admin.userId, ['designer']),
			() => removeMember(admin, admin.userId),
			() => leaveTeam(admin),
		];
		for (const attempt of tries) await expect(attempt()).rejects.toThrow('A team needs an admin');
		const second = await join(house.db, team, 'admin');
		await leaveTeam(admin);
		await expect(leaveTeam(second)).rejects.toThrow('A team needs an admin');
	});

	it('keep an admin when two admins leave at the same moment', async () => {
		for (let round = 0; round < 5; round += 1) {
			const { team, admin } = await newTeam(house.db);
			const second = await join(house.db, team, 'admin');
			const results = await Promise.allSettled([leaveTeam(admin), leaveTeam(second)]);
			expect(results.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
		}
	});
});

describe('the log', () => {
	it('is read page by page, by kind and by person', async () => {
		const { admin } = await newTeam(house.db);
		for (let n = 0; n < 60; n += 1) await changeTeamName(admin, `Name ${n}`);
		const first = await readActivity(admin, everything, 1);
		expect(first).toMatchObject({ total: 61, pages: 2, page: 1, kinds: ['team'] });
		const last = await readActivity(admin, everything, 99);
		expect(last.page).toBe(2);
		expect(last.entries.at(-1)).toMatchObject({ action: 'team.created' });
		const seen = [...first.entries, ...last.entries].map(({ id }) => id);
		expect(new Set(seen).size).toBe(61);
		const none = await readActivity(admin, { kind: 'token', userId: null }, 1);
		expect(none.total).toBe(0);
		const mine = await readActivity(admin, { kind: 'team', userId: admin.userId }, 1);
		expect(mine.total).toBe(61);
	});

	it('takes no wildcard for a kind', async () => {
		const { admin } = await newTeam(house.db);
		expect((await readActivity(admin, { kind: '%', userId: null }, 1)).total).toBe(0);
		expect((await readActivity(admin, { kind: 'te_m', userId: null }, 1)).total).toBe(0);
	});
});
