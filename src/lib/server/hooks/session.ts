import type { Handle, RequestEvent } from '@sveltejs/kit';
import { SESSION_SECONDS, type OpenedSession } from '../services/sessions.service.ts';

/** The name under which Auth.js keeps the session: another one where only https may carry it. */
export const sessionCookie = (url: URL): string =>
	`${url.protocol === 'https:' ? '__Secure-' : ''}authjs.session-token`;

/** The secret of the present session, or nothing that fits any. */
export const currentSession = ({ cookies, url }: Pick<RequestEvent, 'cookies' | 'url'>): string =>
	cookies.get(sessionCookie(url)) ?? '';

/** Hands the browser its session, in the form in which Auth.js would. */
export function setSessionCookie({ cookies, url }: RequestEvent, session: OpenedSession): void {
	cookies.set(sessionCookie(url), session.token, {
		path: '/',
		httpOnly: true,
		sameSite: 'lax',
		secure: url.protocol === 'https:',
		maxAge: SESSION_SECONDS,
	});
}

export function clearSessionCookie({ cookies, url }: RequestEvent): void {
	cookies.delete(sessionCookie(url), { path: '/', secure: url.protocol === 'https:' });
}

/** Finds out who is asking. Without a cookie nobody is, and the database is not asked. */
export const handleSession: Handle = async ({ event, resolve }) => {
	if (currentSession(event)) {
		const session = await event.locals.auth();
		const { id, email, name } = session?.user ?? {};
		if (id && email) event.locals.user = { id, email, name: name ?? null };
	}
	return resolve(event);
};
