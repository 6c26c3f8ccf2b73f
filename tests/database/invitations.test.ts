import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
	acceptAsNewPerson,
	acceptInvitation,
	invite,
	readInvitation,
	readInvitations,
	withdrawInvitation,
} from '../../src/lib/server/services/invitations.service.ts';
import { membership } from '../../src/lib/server/services/teams.service.ts';
import { newPerson, newTeam, openHouse } from '../support/house.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
beforeAll(async () => {
	house = await openHouse();
});
afterAll(() => house.close());

let numbered = 0;
const newAddress = () => `invited-${(numbered += 1)}@partners.example`;
const secretFor = (email: string) => house.mailbox.linkTo(email).split('/').at(-1) ?? '';

async function invited(email = newAddress()) {
	const { team, admin } = await newTeam(house.db);
	await invite(admin, 'Marit', email, ['designer']);
	return { team, admin, email, secret: secretFor(email) };
}

describe('an invitation', () => {
	it('goes by mail to the invited and is kept only as a digest', async () => {
		const { admin, email, secret } = await invited();
		const [invitation] = await readInvitations(admin);
		expect(invitation).toMatchObject({ email, roles: ['designer'] });
		const rows = await house.db.selectFrom('invitations').selectAll().execute();
		expect(JSON.stringify(rows)).not.toContain(secret);
		const log = await house.db.selectFrom('activity').selectAll().execute();
		expect(JSON.stringify(log)).not.toContain(secret);
		expect(house.mailbox.linkTo(email)).toMatch(/^https:\/\/maps\.example\/invitation\/[\w-]{43}$/);
	});

	it('lets a hostile team name into the mail as words only', async () => {
		const { admin } = await newTeam(house.db, '<b onclick="x">\r\nBcc: all@example.com');
		const email = newAddress();
		await invite(admin, '<i>Marit</i>', email, ['designer']);
		const mail = house.mailbox.mails.at(-1);
		expect(mail?.to).toEqual([email]);
		expect(mail?.html).not.toMatch(/<b |<i>/);
		expect(mail?.subject).not.toMatch(/[\r\n]/);
	});

	it('is accepted once, by the one who was invited', async () => {
		const { team, email, secret } = await invited();
		const stranger = await newPerson(house.db);
		await expect(acceptInvitation(secret, stranger)).rejects.toThrow(`is for ${email}`);
		const { slug, session } = await acceptAsNewPerson(secret, 'New Person', 'a long password');
		expect(slug).toBe(team.slug);
		const { userId } = await house.db
			.selectFrom('Session')
			.select('userId')
			.where('sessionToken', '=', session.token)
			.executeTakeFirstOrThrow();
		expect(await membership(slug, userId)).toMatchObject({ roles: ['designer'] });
		await expect(acceptInvitation(secret, { id: userId, email })).rejects.toThrow(
			'no such open invitation',
		);
		expect(await readInvitation(secret)).toBeNull();
	});

	it('cannot take over an account that exists', async () => {
		const person = await newPerson(house.db);
		const { secret, team } = await invited(person.email);
		expect(await readInvitation(secret)).toMatchObject({ known: true });
		const taken = acceptAsNewPerson(secret, 'Impostor', 'a long password');
		await expect(taken).rejects.toThrow('has an account already');
		expect(await acceptInvitation(secret, person)).toBe(team.slug);
	});

	it('makes one account when it is accepted twice at the same moment', async () => {
		const { secret, email } = await invited();
		const results = await Promise.allSettled([
			acceptAsNewPerson(secret, 'One', 'a long password'),
			acceptAsNewPerson(secret, 'Two', 'a long password'),
		]);
		expect(results.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
		const users = await house.db
			.selectFrom('User')
			.select('id')
			.where('email', '=', email)
			.execute();
		expect(users).toHaveLength(1);
	});

	it('does nothing once withdrawn, expired, replaced or made up', async () => {
		const withdrawn = await invited();
		const [open] = await readInvitations(withdrawn.admin);
		await withdrawInvitation(withdrawn.admin, open.id);
		const expired = await invited();
		await house.db
			.updateTable('invitations')
			.set({ expires_at: new Date(Date.now() - 1000) })
			.where('email', '=', expired.email)
			.execute();
		const replaced = await invited();
		await invite(replaced.admin, 'Marit', replaced.email, ['analyst']);
		for (const secret of [withdrawn.secret, expired.secret, replaced.secret, 'made-up']) {
			expect(await readInvitation(secret)).toBeNull();
			const accepted = acceptAsNewPerson(secret, 'Late', 'a long password');
			await expect(accepted).rejects.toThrow('no such open invitation');
		}
		expect(await readInvitation(secretFor(replaced.email))).toMatchObject({ roles: ['analyst'] });
	});

	it('of another team cannot be withdrawn', async () => {
		const { admin } = await invited();
		const other = await invited();
		const [open] = await readInvitations(other.admin);
		await expect(withdrawInvitation(admin, open.id)).rejects.toThrow('no such open invitation');
	});

	it('is not sent to a member, nor without end to one mailbox', async () => {
		const { admin } = await newTeam(house.db);
		const email = newAddress();
		for (let n = 0; n < 6; n += 1) await invite(admin, 'Marit', email, ['designer']);
		await expect(invite(admin, 'Marit', email, ['designer'])).rejects.toThrow('Too many tries');
		await acceptAsNewPerson(secretFor(email), 'New', 'a long password');
		await expect(invite(admin, 'Marit', email, ['designer'])).rejects.toThrow(
			'in the team already',
		);
	});
});
