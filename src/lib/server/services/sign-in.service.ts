import { passwordFits } from '../access/password.ts';
import { database } from '../database/connection.ts';
import { findSignIn } from '../repositories/users.repository.ts';
import { limits, reset, use } from './limits.service.ts';
import { Refused } from './outcomes.ts';
import { openSession, type OpenedSession } from './sessions.service.ts';

/**
 * Signs in by e-mail and password. One answer for an unknown address, an account without a password and a
 * wrong password, in about the same time. Every try is counted before it is checked, so that many at once
 * gain nothing; a right one clears the count for this person at this address.
 * @throws Refused when they do not fit, TooMany after too many tries
 */
export async function signInWithPassword(
	email: string,
	password: string,
	address: string,
): Promise<OpenedSession> {
	const personHere = `${email} ${address}`;
	await use(limits.passwordByAddress, address);
	await use(limits.passwordByPerson, email);
	await use(limits.passwordByPersonAndAddress, personHere);
	const person = await findSignIn(database(), email);
	const fits = await passwordFits(person?.hash, password);
	if (!person || !fits) throw new Refused('E-mail and password do not fit together.');
	await reset(limits.passwordByPersonAndAddress, personHere);
	return openSession(person.id);
}
