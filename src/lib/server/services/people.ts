import type { Member } from '../access/member.ts';
import type { Db } from '../database/connection.ts';
import { findPerson } from '../repositories/people.repository.ts';

/** What a person is called on pages: their name, else the part of their address before the @. */
export const personName = (row: {
	by_name: string | null;
	by_email: string | null;
}): string | null => row.by_name ?? row.by_email?.split('@')[0] ?? null;

/** The same for whoever acts now; an API token goes by its name. */
export async function nameOfMember(db: Db, member: Member): Promise<string> {
	const person = await findPerson(db, member.userId, member.tokenId);
	return (person && personName(person)) ?? 'a member of the team';
}
