import type { Actions } from '@sveltejs/kit';
import { z } from 'zod';
import { redirect } from '@sveltejs/kit';
import { email, manyOf, rowId } from '$lib/schemas/people';
import { memberFor, userFor } from '$lib/server/access/guard';
import { mayDo } from '$lib/server/access/member';
import { roles } from '$lib/server/access/roles';
import { roleWords } from '$lib/server/access/role-words';
import { attempt, readForm } from '$lib/server/forms';
import {
	invite,
	readInvitations,
	withdrawInvitation,
} from '$lib/server/services/invitations.service';
import {
	changeRoles,
	leaveTeam,
	readMembers,
	removeMember,
} from '$lib/server/services/members.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'team.read');
	const manages = mayDo(member, 'members.manage');
	const [members, invitations] = await Promise.all([
		readMembers(member),
		manages ? readInvitations(member) : [],
	]);
	return { members, invitations, manages, me: member.userId, roleWords };
}) satisfies PageServerLoad;

const chosenRoles = manyOf(z.enum(roles), 'Choose at least one role.');
const inviteForm = z.object({ email, roles: chosenRoles });
const rolesForm = z.object({ user: rowId, roles: chosenRoles });

export const actions = {
	invite: async ({ request, locals }) => {
		const member = memberFor(locals, 'members.manage');
		const { data, failure } = await readForm(request, inviteForm);
		if (failure) return failure;
		const user = userFor(locals);
		const sent = await attempt(
			() => invite(member, user.name ?? user.email, data.email, data.roles),
			{
				email: data.email,
			},
		);
		return sent.failure ?? { done: `The invitation is on its way to ${data.email}.` };
	},
	withdraw: async ({ request, locals }) => {
		const member = memberFor(locals, 'members.manage');
		const { data, failure } = await readForm(request, z.object({ invitation: rowId }));
		if (failure) return failure;
		const withdrawn = await attempt(() => withdrawInvitation(member, data.invitation));
		return withdrawn.failure ?? { done: 'The invitation is withdrawn; its link no longer works.' };
	},
	roles: async ({ request, locals }) => {
		const member = memberFor(locals, 'members.manage');
		const { data, failure } = await readForm(request, rolesForm);
		if (failure) return failure;
		const changed = await attempt(() => changeRoles(member, data.user, data.roles));
		return changed.failure ?? { done: 'The roles are changed.' };
	},
	remove: async ({ request, locals }) => {
		const member = memberFor(locals, 'members.manage');
		const { data, failure } = await readForm(request, z.object({ user: rowId }));
		if (failure) return failure;
		const removed = await attempt(() => removeMember(member, data.user));
		return removed.failure ?? { done: 'The member is removed. What they made stays.' };
	},
	leave: async ({ locals }) => {
		const member = memberFor(locals, 'team.read');
		const left = await attempt(() => leaveTeam(member));
		if (left.failure) return left.failure;
		redirect(303, '/teams');
	},
} satisfies Actions;
