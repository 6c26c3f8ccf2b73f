import { error, redirect } from '@sveltejs/kit';
import { mayReadDemoMail } from '$lib/server/services/demo-mail.service';
import { readCaughtMail } from '$lib/server/mail/inbox';
import type { PageServerLoad } from './$types';

/** The demo's caught mails hold everybody's links: only the demo team's admin sees them. */
export const load = (async ({ locals, setHeaders }) => {
	if (!locals.user) redirect(303, '/sign-in?to=/mail');
	if (!(await mayReadDemoMail(locals.user.id))) error(404, 'There is no page at this address.');
	setHeaders({ 'cache-control': 'no-store' });
	return { mails: await readCaughtMail() };
}) satisfies PageServerLoad;
