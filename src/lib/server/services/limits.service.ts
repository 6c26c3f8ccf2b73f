import { database } from '../database/connection.ts';
import { countUse, forgetUses } from '../repositories/limits.repository.ts';
import { TooMany } from './outcomes.ts';

/** So many uses in so many seconds. */
export interface Limit {
	name: string;
	uses: number;
	seconds: number;
}

/** Common practice, no source: far above what a person does, far below what guessing needs. */
export const limits = {
	passwordByPersonAndAddress: { name: 'password', uses: 10, seconds: 900 },
	passwordByPerson: { name: 'password-person', uses: 100, seconds: 3600 },
	passwordByAddress: { name: 'password-address', uses: 100, seconds: 900 },
	mailsToPerson: { name: 'mails-to', uses: 6, seconds: 3600 },
	mailsFromTeam: { name: 'mails-from', uses: 200, seconds: 86_400 },
	teamsByPerson: { name: 'teams', uses: 20, seconds: 86_400 },
	linksByAddress: { name: 'links-address', uses: 240, seconds: 900 },
	writesByAddress: { name: 'writes-address', uses: 300, seconds: 60 },
	writesByPerson: { name: 'writes-person', uses: 300, seconds: 60 },
	callsByToken: { name: 'calls', uses: 600, seconds: 60 },
} as const satisfies Record<string, Limit>;

/** Counts a use by this subject and throws TooMany once the limit is passed. */
export async function use(limit: Limit, subject: string): Promise<void> {
	const { hits, endsIn } = await countUse(database(), keyOf(limit, subject), limit.seconds);
	if (hits > limit.uses) throw new TooMany(Math.max(1, Math.ceil(endsIn)));
}

/** Starts counting afresh, as after the right password. */
export const reset = (limit: Limit, subject: string): Promise<void> =>
	forgetUses(database(), keyOf(limit, subject));

const keyOf = (limit: Limit, subject: string): string => `${limit.name}:${subject}`;
