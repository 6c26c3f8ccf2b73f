import { redirect } from '@sveltejs/kit';
import { z } from 'zod';
import type { PageServerLoad } from './$types';

const parts = z.object({
	token: z.string().min(1),
	email: z.string().min(3),
	callbackUrl: z.string().default('/teams'),
});

/** Shows who would be signed in and leaves the last step to a person: mail scanners press no buttons. */
export const load = (({ url, setHeaders }) => {
	const read = parts.safeParse(Object.fromEntries(url.searchParams));
	if (!read.success) redirect(303, '/sign-in?error=Verification');
	setHeaders({ 'cache-control': 'no-store', 'referrer-policy': 'same-origin' });
	return { parts: read.data };
}) satisfies PageServerLoad;
