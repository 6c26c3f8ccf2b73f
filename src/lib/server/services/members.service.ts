import { requireAccess, type Member } from '../access/member.ts';
import type { Role } from '../access/roles.ts';
import { database, inTransaction, type Db } from '../database/connection.ts';
import {
	deleteMember,
	listMembers,
	lockMembers,
	setRoles,
} from '../repositories/members.repository.ts';
import { record } from './activity.service.ts';
import { NotFound, Refused } from './outcomes.ts';
import { knownRoles } from './teams.service.ts';

export async function readMembers(member: Member) {
	requireAccess(member, 'team.read');
	const rows = await listMembers(database(), member.team.id);
	return rows.map((row) => ({ ...row, roles: knownRoles(row.roles) }));
}

/** Gives a member these roles instead of the present ones. The team keeps at least one admin. */
export async function changeRoles(
	member: Member,
	userId: string,
	roles: readonly Role[],
): Promise<void> {
	requireAccess(member, 'members.manage');
	await inTransaction(async (trx) => {
		const before = await heldRoles(trx, member, userId, !roles.includes('admin'));
		await setRoles(trx, member.team.id, userId, roles);
		const detail = { from: before, to: roles };
		await record(trx, member, 'member.roles-changed', { kind: 'member', id: userId }, detail);
	});
}

/** Takes a member out of the team; what they made stays. */
export async function removeMember(member: Member, userId: string): Promise<void> {
	requireAccess(member, 'members.manage');
	await takeOut(member, userId, 'member.removed');
}

/** Leaves the team oneself: everyone may, but the last admin. */
export async function leaveTeam(member: Member): Promise<void> {
	requireAccess(member, 'team.read');
	if (!member.userId) throw new NotFound('member');
	await takeOut(member, member.userId, 'member.left');
}

async function takeOut(member: Member, userId: string, action: string): Promise<void> {
	await inTransaction(async (trx) => {
		const roles = await heldRoles(trx, member, userId, true);
		await deleteMember(trx, member.team.id, userId);
		await record(trx, member, action, { kind: 'member', id: userId }, { roles });
	});
}

/**
 * Locks the team's members and tells what this one holds.
 * @param losesAdmin whether this one is about to be no admin any more
 */
async function heldRoles(
	trx: Db,
	member: Member,
	userId: string,
	losesAdmin: boolean,
): Promise<string[]> {
	const members = await lockMembers(trx, member.team.id);
	const held = members.find((row) => row.user_id === userId)?.roles;
	if (!held) throw new NotFound('member');
	const admins = members.filter((row) => row.roles.includes('admin'));
	if (losesAdmin && held.includes('admin') && admins.length === 1) {
		throw new Refused('A team needs an admin: make another member admin first.');
	}
	return held;
}
