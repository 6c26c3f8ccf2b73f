import { requireAccess, type Member } from '../access/member.ts';
import { hashPassword } from '../access/password.ts';
import type { Role } from '../access/roles.ts';
import { digestOf, newSecret } from '../access/secret.ts';
import { config } from '../config.ts';
import { database, inTransaction, type Db } from '../database/connection.ts';
import { invitationMail } from '../mail/messages.ts';
import { sendMail } from '../mail/transport.ts';
import {
	findOpenInvitation,
	insertInvitation,
	listOpenInvitations,
	markAccepted,
	revokeEarlier,
	revokeInvitation,
} from '../repositories/invitations.repository.ts';
import { insertMember, listMembers } from '../repositories/members.repository.ts';
import { findUserByEmail, insertUser, setPasswordHash } from '../repositories/users.repository.ts';
import { record } from './activity.service.ts';
import { limits, use } from './limits.service.ts';
import { NotFound, Refused } from './outcomes.ts';
import { openSession, type OpenedSession } from './sessions.service.ts';

export const INVITATION_DAYS = 14;

export async function readInvitations(member: Member) {
	requireAccess(member, 'members.manage');
	return listOpenInvitations(database(), member.team.id);
}

/**
 * Invites somebody by mail. The link goes to that mailbox and nowhere else, not to the one who invites:
 * following it is the proof that the address is theirs.
 */
export async function invite(
	member: Member,
	inviter: string,
	email: string,
	roles: readonly Role[],
): Promise<void> {
	requireAccess(member, 'members.manage');
	if (!config().mail) throw new Refused('No mail server is set up, so nobody can be invited yet.');
	const members = await listMembers(database(), member.team.id);
	if (members.some((row) => row.email === email)) {
		throw new Refused('This person is in the team already.', 'email');
	}
	await use(limits.mailsFromTeam, member.team.id);
	await use(limits.mailsToPerson, email);
	const secret = newSecret();
	await inTransaction(async (trx) => {
		await keepInvitation(trx, member, email, roles, secret);
		const link = `${config().origin}/invitation/${secret}`;
		await sendMail(invitationMail({ to: email, inviter, team: member.team.name, roles, link }));
	});
}

async function keepInvitation(
	trx: Db,
	member: Member,
	email: string,
	roles: readonly Role[],
	secret: string,
): Promise<void> {
	await revokeEarlier(trx, member.team.id, email);
	const { id } = await insertInvitation(trx, {
		team_id: member.team.id,
		email,
		roles: [...roles],
		token_hash: digestOf(secret),
		invited_by: member.userId,
		expires_at: new Date(Date.now() + INVITATION_DAYS * 86_400_000),
	});
	await record(trx, member, 'member.invited', { kind: 'invitation', id }, { email, roles });
}

export async function withdrawInvitation(member: Member, id: string): Promise<void> {
	requireAccess(member, 'members.manage');
	await inTransaction(async (trx) => {
		const revoked = await revokeInvitation(trx, member.team.id, id);
		if (!revoked) throw new NotFound('open invitation');
		const subject = { kind: 'invitation', id };
		await record(trx, member, 'member.invitation-withdrawn', subject, { email: revoked.email });
	});
}

/** What the holder of the link may know: for which team, to which address, whether an account exists. */
export async function readInvitation(secret: string) {
	const found = await findOpenInvitation(database(), digestOf(secret));
	if (!found) return null;
	const known = (await findUserByEmail(database(), found.email)) !== undefined;
	return { team: found.teamName, email: found.email, roles: found.roles, known };
}

/** Accepts as the one who is signed in. @returns the team's slug */
export async function acceptInvitation(
	secret: string,
	user: { id: string; email: string },
): Promise<string> {
	return inTransaction((trx) => join(trx, secret, user));
}

/** Accepts by making an account with a password, for an address that has none. */
export async function acceptAsNewPerson(
	secret: string,
	name: string,
	password: string,
): Promise<{ slug: string; session: OpenedSession }> {
	const hash = await hashPassword(password);
	return inTransaction(async (trx) => {
		const invitation = await findOpenInvitation(trx, digestOf(secret), true);
		if (!invitation) throw new NotFound('open invitation');
		if (await findUserByEmail(trx, invitation.email)) {
			throw new Refused('This address has an account already: sign in to accept.');
		}
		const user = await insertUser(trx, invitation.email, name);
		await setPasswordHash(trx, user.id, hash);
		const slug = await join(trx, secret, user);
		return { slug, session: await openSession(user.id, trx) };
	});
}

async function join(trx: Db, secret: string, user: { id: string; email: string }): Promise<string> {
	const invitation = await findOpenInvitation(trx, digestOf(secret), true);
	if (!invitation) throw new NotFound('open invitation');
	if (invitation.email !== user.email) {
		throw new Refused(`This invitation is for ${invitation.email}. Sign in with that address.`);
	}
	const { team_id, slug, roles } = invitation;
	await markAccepted(trx, invitation.id);
	if (!(await insertMember(trx, team_id, user.id, roles))) return slug;
	const team = { id: team_id, slug, name: invitation.teamName };
	const subject = { kind: 'member', id: user.id };
	await record(trx, { team, userId: user.id, tokenId: null }, 'member.joined', subject, { roles });
	return slug;
}
