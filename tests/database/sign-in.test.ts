import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { hashPassword } from '../../src/lib/server/access/password.ts';
import { setPasswordHash } from '../../src/lib/server/repositories/users.repository.ts';
import { changePassword, waysIn } from '../../src/lib/server/services/account.service.ts';
import { limits } from '../../src/lib/server/services/limits.service.ts';
import { Refused, TooMany } from '../../src/lib/server/services/outcomes.ts';
import {
	endOtherSessions,
	endSession,
	openSession,
	SESSION_SECONDS,
	sessionsOf,
} from '../../src/lib/server/services/sessions.service.ts';
import { signInWithPassword } from '../../src/lib/server/services/sign-in.service.ts';
import { newPerson, openHouse } from '../support/house.ts';

let house: Awaited<ReturnType<typeof openHouse>>;
beforeAll(async () => {
	house = await openHouse();
	await windowsEndLater();
}, 180_000);
afterAll(() => house.close());

/** Counts start anew at the end of a window; one that ends during these tests would let guesses through. */
async function windowsEndLater() {
	const { seconds } = limits.passwordByPersonAndAddress;
	const left = seconds - ((Date.now() / 1000) % seconds);
	if (left < 60) await new Promise((resolve) => setTimeout(resolve, left * 1000 + 100));
}

const password = 'four plain words here';
async function personWithPassword() {
	const person = await newPerson(house.db);
	await setPasswordHash(house.db, person.id, await hashPassword(password));
	return person;
}
const outcome = (work: Promise<unknown>) =>
	work.then(
		() => 'in',
		(problem: Error) => problem.constructor.name,
	);
const { uses } = limits.passwordByPersonAndAddress;

describe('signing in by e-mail and password', () => {
	it('opens a session that lasts fourteen days', async () => {
		const person = await personWithPassword();
		const { token, expires } = await signInWithPassword(person.email, password, '192.0.2.1');
		const row = await house.db
			.selectFrom('Session')
			.selectAll()
			.where('sessionToken', '=', token)
			.executeTakeFirstOrThrow();
		expect(row.userId).toBe(person.id);
		expect(row.expires).toEqual(expires);
		const seconds = (expires.getTime() - Date.now()) / 1000;
		expect(Math.abs(seconds - SESSION_SECONDS)).toBeLessThan(60);
		// 256 random bits: OWASP session management asks for 64 at least
		expect(Buffer.from(token, 'base64url')).toHaveLength(32);
	});

	it('keeps an argon2id hash with the parameters of the OWASP cheat sheet, never the password', async () => {
		const person = await personWithPassword();
		const { hash } = await house.db
			.selectFrom('passwords')
			.select('hash')
			.where('user_id', '=', person.id)
			.executeTakeFirstOrThrow();
		// OWASP password storage cheat sheet: Argon2id, m=19456 (19 MiB), t=2, p=1
		expect(hash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
		expect(hash).not.toContain(password);
	});

	it('gives one answer for an unknown address, an account without password and a wrong password', async () => {
		const person = await personWithPassword();
		const bare = await newPerson(house.db);
		const answers = await Promise.all(
			[
				signInWithPassword(person.email, 'something else', '192.0.2.2'),
				signInWithPassword(bare.email, password, '192.0.2.2'),
				signInWithPassword('nobody@people.example', password, '192.0.2.2'),
			].map((work) =>
				work.catch((problem: Error) => `${problem.constructor.name}: ${problem.message}`),
			),
		);
		expect(new Set(answers)).toEqual(
			new Set(['Refused: E-mail and password do not fit together.']),
		);
	});

	it('stops guessing after ten tries, even with the right password, at that address alone', async () => {
		const person = await personWithPassword();
		for (let n = 0; n < uses; n += 1) {
			const guess = signInWithPassword(person.email, `guess ${n}`, '192.0.2.3');
			expect(await outcome(guess)).toBe('Refused');
		}
		expect(await outcome(signInWithPassword(person.email, password, '192.0.2.3'))).toBe('TooMany');
		expect(await outcome(signInWithPassword(person.email, password, '192.0.2.4'))).toBe('in');
	});

	it('checks no more than the limit when guesses come all at once', async () => {
		const person = await personWithPassword();
		const guesses = Array.from({ length: 40 }, (_, n) =>
			outcome(signInWithPassword(person.email, `guess ${n}`, '192.0.2.5')),
		);
		const answers = await Promise.all(guesses);
		expect(answers.filter((answer) => answer === 'Refused')).toHaveLength(uses);
		expect(answers.filter((answer) => answer === 'TooMany')).toHaveLength(40 - uses);
	});

	it('counts afresh after the right password', async () => {
		const person = await personWithPassword();
		for (let round = 0; round < 2; round += 1) {
			for (let n = 0; n < uses - 1; n += 1) {
				const guess = signInWithPassword(person.email, 'wrong', '192.0.2.6');
				await expect(guess).rejects.toThrow(Refused);
			}
			expect(await outcome(signInWithPassword(person.email, password, '192.0.2.6'))).toBe('in');
		}
	});

	it('says how long to wait', async () => {
		const person = await personWithPassword();
		const guesses = Array.from({ length: uses + 1 }, () =>
			signInWithPassword(person.email, 'wrong', '192.0.2.7').catch((problem: unknown) => problem),
		);
		const waiting = (await Promise.all(guesses)).find((problem) => problem instanceof TooMany);
		expect(waiting).toMatchObject({ message: expect.stringMatching(/Wait \d+ (seconds|minutes)/) });
		const { retryAfter } = waiting as TooMany;
		expect(retryAfter).toBeGreaterThan(0);
		expect(retryAfter).toBeLessThanOrEqual(limits.passwordByPersonAndAddress.seconds);
	});
});

describe('sessions and passwords of a person', () => {
	it('lists the sessions without their secrets and ends all others', async () => {
		const person = await newPerson(house.db);
		const here = await openSession(person.id);
		const elsewhere = await openSession(person.id);
		const listed = await sessionsOf(person.id, here.token);
		expect(listed.filter(({ current }) => current)).toHaveLength(1);
		expect(JSON.stringify(listed)).not.toContain(elsewhere.token);
		expect(await endOtherSessions(person.id, here.token)).toBe(1);
		expect(await sessionsOf(person.id, here.token)).toHaveLength(1);
		await endSession(here.token);
		expect(await sessionsOf(person.id, here.token)).toEqual([]);
	});

	it('changes a password only with the present one, and signs out everywhere else', async () => {
		const person = await personWithPassword();
		const here = await openSession(person.id);
		await openSession(person.id);
		await expect(
			changePassword(person.id, here.token, 'wrong', 'another long one'),
		).rejects.toMatchObject({
			field: 'current',
		});
		expect(await sessionsOf(person.id, here.token)).toHaveLength(2);
		await changePassword(person.id, here.token, password, 'another long one');
		expect(await sessionsOf(person.id, here.token)).toMatchObject([{ current: true }]);
		expect(await outcome(signInWithPassword(person.email, password, '192.0.2.8'))).toBe('Refused');
		const renewed = signInWithPassword(person.email, 'another long one', '192.0.2.8');
		expect(await outcome(renewed)).toBe('in');
	});

	it('lets somebody who came without a password set a first one', async () => {
		const person = await newPerson(house.db);
		const here = await openSession(person.id);
		expect(await waysIn(person.id)).toEqual({ hasPassword: false, providers: [] });
		await changePassword(person.id, here.token, '', password);
		expect(await waysIn(person.id)).toEqual({ hasPassword: true, providers: [] });
	});
});
