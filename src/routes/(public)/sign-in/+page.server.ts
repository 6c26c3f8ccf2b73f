import { redirect, type Actions } from '@sveltejs/kit';
import { z } from 'zod';
import { email, typedPassword } from '$lib/schemas/people';
import { placeOnThisSite } from '$lib/schemas/place';
import { config } from '$lib/server/config';
import { attempt, readForm } from '$lib/server/forms';
import { signIn } from '$lib/server/hooks/auth';
import { setSessionCookie } from '$lib/server/hooks/session';
import { limits, use } from '$lib/server/services/limits.service';
import { signInWithPassword } from '$lib/server/services/sign-in.service';
import type { PageServerLoad } from './$types';

/** What Auth.js reports in the address when a way in did not work, in words. */
const troubles: Record<string, string> = {
	OAuthAccountNotLinked:
		'There is an account with this e-mail already. Sign in to it another way first, then connect your organisation on your account page.',
	Verification: 'This link has been used or is too old. Ask for a new one.',
	AccessDenied:
		'Your organisation has not confirmed your e-mail address, so it cannot be used here.',
};

export const load = (({ locals, url }) => {
	const to = placeOnThisSite(url.searchParams.get('to'));
	if (locals.user) redirect(303, to);
	const error = url.searchParams.get('error');
	return {
		to,
		trouble: error && (troubles[error] ?? 'Signing in did not work. Try again, or another way.'),
		byMail: config().mail !== null,
		organisation: config().oidc?.name ?? null,
	};
}) satisfies PageServerLoad;

export const actions = {
	password: async (event) => {
		const schema = z.object({ email, password: typedPassword, to: z.string().optional() });
		const { data, failure } = await readForm(event.request, schema);
		if (failure) return failure;
		const signedIn = await attempt(
			() => signInWithPassword(data.email, data.password, event.getClientAddress()),
			{ email: data.email },
		);
		if (signedIn.failure) return signedIn.failure;
		setSessionCookie(event, signedIn.data);
		redirect(303, placeOnThisSite(data.to));
	},
	link: async (event) => {
		const { data, failure } = await readForm(event.request.clone(), z.object({ email }));
		if (failure) return failure;
		const allowed = await attempt(() => use(limits.mailsToPerson, data.email), data);
		if (allowed.failure) return allowed.failure;
		await signIn(event);
	},
	organisation: async (event) => {
		await signIn(event);
	},
} satisfies Actions;
