import { requireAccess, type Member } from '../access/member.ts';
import { actionsOf, scopes, type Scope } from '../access/scopes.ts';
import { digestOf, newSecret } from '../access/secret.ts';
import { database, inTransaction } from '../database/connection.ts';
import {
	findLiveToken,
	insertToken,
	listTokens,
	revokeToken,
	touchToken,
} from '../repositories/tokens.repository.ts';
import { record } from './activity.service.ts';
import { NotFound } from './outcomes.ts';

/** Tells at sight, and to a scanner of leaked secrets, what this is. */
const PREFIX = 'merestone_';

/** A token as the one who acts: no roles, but the actions that its scopes allow. */
export type TokenMember = Member & { scopes: readonly Scope[] };

export async function readTokens(member: Member) {
	requireAccess(member, 'tokens.manage');
	return listTokens(database(), member.team.id);
}

/** Makes a token. @returns its text, which is kept nowhere and cannot be shown again */
export async function createToken(
	member: Member,
	wanted: { name: string; scopes: readonly Scope[]; days: number },
): Promise<string> {
	requireAccess(member, 'tokens.manage');
	const token = PREFIX + newSecret();
	await inTransaction(async (trx) => {
		const { id } = await insertToken(trx, {
			team_id: member.team.id,
			name: wanted.name,
			hash: digestOf(token),
			hint: token.slice(0, PREFIX.length + 4),
			scopes: [...wanted.scopes],
			created_by: member.userId,
			expires_at: new Date(Date.now() + wanted.days * 86_400_000),
		});
		const detail = { name: wanted.name, scopes: wanted.scopes, days: wanted.days };
		await record(trx, member, 'token.made', { kind: 'token', id }, detail);
	});
	return token;
}

export async function withdrawToken(member: Member, id: string): Promise<void> {
	requireAccess(member, 'tokens.manage');
	await inTransaction(async (trx) => {
		const revoked = await revokeToken(trx, member.team.id, id);
		if (!revoked) throw new NotFound('token');
		await record(trx, member, 'token.withdrawn', { kind: 'token', id }, { name: revoked.name });
	});
}

/** The member behind a bearer token, or null when it is unknown, withdrawn or past its end. */
export async function memberForToken(bearer: string): Promise<TokenMember | null> {
	if (!bearer.startsWith(PREFIX)) return null;
	const row = await findLiveToken(database(), digestOf(bearer));
	if (!row) return null;
	await touchToken(database(), row.id);
	const held = scopes.filter((scope) => row.scopes.includes(scope));
	return {
		team: { id: row.team_id, slug: row.slug, name: row.teamName },
		userId: null,
		tokenId: row.id,
		roles: [],
		actions: actionsOf(held),
		scopes: held,
	};
}
