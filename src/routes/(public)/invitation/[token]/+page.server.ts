import { error, redirect, type Actions } from '@sveltejs/kit';
import { z } from 'zod';
import { newPassword, PASSWORD_LENGTH, personName } from '$lib/schemas/people';
import { attempt, readForm } from '$lib/server/forms';
import { setSessionCookie } from '$lib/server/hooks/session';
import {
	acceptAsNewPerson,
	acceptInvitation,
	readInvitation,
} from '$lib/server/services/invitations.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ params, locals, setHeaders }) => {
	const invitation = await readInvitation(params.token);
	if (!invitation)
		error(404, 'This invitation has been used, withdrawn or is too old. Ask for a new one.');
	setHeaders({ 'cache-control': 'no-store', 'referrer-policy': 'same-origin' });
	const fits = locals.user?.email === invitation.email;
	return { invitation, fits, passwordLength: PASSWORD_LENGTH };
}) satisfies PageServerLoad;

export const actions = {
	accept: async ({ params, locals }) => {
		const { token = '' } = params;
		if (!locals.user) redirect(303, `/sign-in?to=/invitation/${token}`);
		const user = locals.user;
		const joined = await attempt(() => acceptInvitation(token, user));
		if (joined.failure) return joined.failure;
		redirect(303, `/${joined.data}`);
	},
	join: async (event) => {
		const schema = z.object({ name: personName, password: newPassword });
		const { data, failure } = await readForm(event.request, schema);
		if (failure) return failure;
		const { token = '' } = event.params;
		const joined = await attempt(() => acceptAsNewPerson(token, data.name, data.password), {
			name: data.name,
		});
		if (joined.failure) return joined.failure;
		setSessionCookie(event, joined.data.session);
		redirect(303, `/${joined.data.slug}`);
	},
} satisfies Actions;
