import { type Actions } from '@sveltejs/kit';
import { z } from 'zod';
import { newPassword, PASSWORD_LENGTH, personName } from '$lib/schemas/people';
import { userFor } from '$lib/server/access/guard';
import { config } from '$lib/server/config';
import { attempt, readForm } from '$lib/server/forms';
import { signIn } from '$lib/server/hooks/auth';
import { currentSession } from '$lib/server/hooks/session';
import { changeName, changePassword, waysIn } from '$lib/server/services/account.service';
import { endOtherSessions, sessionsOf } from '$lib/server/services/sessions.service';
import type { PageServerLoad } from './$types';

export const load = (async (event) => {
	const user = userFor(event.locals);
	const [ways, sessions] = await Promise.all([
		waysIn(user.id),
		sessionsOf(user.id, currentSession(event)),
	]);
	const organisation = config().oidc?.name ?? null;
	return { ...ways, sessions, organisation, passwordLength: PASSWORD_LENGTH };
}) satisfies PageServerLoad;

const passwordForm = z.object({ current: z.string().max(1000).default(''), next: newPassword });

export const actions = {
	name: async ({ request, locals }) => {
		const user = userFor(locals);
		const { data, failure } = await readForm(request, z.object({ name: personName }));
		if (failure) return failure;
		await changeName(user.id, data.name);
		return { done: 'Your name is changed.' };
	},
	password: async (event) => {
		const user = userFor(event.locals);
		const { data, failure } = await readForm(event.request, passwordForm);
		if (failure) return failure;
		const session = currentSession(event);
		const set = await attempt(() => changePassword(user.id, session, data.current, data.next));
		if (set.failure) return set.failure;
		return { done: 'The new password holds. You are signed out everywhere else.' };
	},
	endOthers: async (event) => {
		const ended = await endOtherSessions(userFor(event.locals).id, currentSession(event));
		return {
			done: ended ? 'You are signed out everywhere else.' : 'You were signed in only here.',
		};
	},
	organisation: async (event) => {
		userFor(event.locals);
		await signIn(event);
	},
} satisfies Actions;
