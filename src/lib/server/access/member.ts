import { allows, type Action, type Role } from './roles.ts';

/** Whoever acts within a team: a signed-in member, or an API token whose scopes were made into roles' actions. */
export interface Member {
	team: { id: string; slug: string; name: string };
	/** null for an API token */
	userId: string | null;
	tokenId: string | null;
	roles: readonly Role[];
	/** for a token: the actions its scopes allow; for a person: null, the roles decide */
	actions: readonly Action[] | null;
}

/** Thrown by services when the one who acts may not; routes turn it into 403. */
export class Forbidden extends Error {
	constructor(readonly action: Action) {
		super(`this needs the right "${action}"`);
	}
}

export const mayDo = (member: Member, action: Action): boolean =>
	member.actions ? member.actions.includes(action) : allows(member.roles, action);

export function requireAccess(member: Member, action: Action): void {
	if (!mayDo(member, action)) throw new Forbidden(action);
}
