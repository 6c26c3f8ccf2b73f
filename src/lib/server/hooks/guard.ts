import type { Handle, RequestEvent } from '@sveltejs/kit';
import { isTeamSlug } from '../access/reserved.ts';
import { membership } from '../services/teams.service.ts';
import { elsewhere, plainAnswer } from './answer.ts';

/**
 * Nobody comes past here unsigned into the working part of the product, and nobody into a team that is not
 * theirs. It stands before form actions and handlers, which run no layout's load; a page that is only read
 * goes on to its loads, which say the same (`userFor`, `memberFor`) and can show it as a page.
 */
export const handleGuard: Handle = async ({ event, resolve }) => {
	const route = event.route.id ?? '';
	const { locals } = event;
	if (!route.startsWith('/(app)')) return resolve(event);
	if (locals.user && route.startsWith('/(app)/[team]')) {
		const slug = event.params.team ?? '';
		locals.member = isTeamSlug(slug) ? await membership(slug, locals.user.id) : null;
	}
	locals.signInAt = signInPath(event);
	if (isPageRead(event)) return resolve(event);
	if (!locals.user) return unsigned(event, locals.signInAt);
	if (route.startsWith('/(app)/[team]') && !locals.member) {
		return plainAnswer(event, 404, 'There is no such team here.');
	}
	return resolve(event);
};

/** People are sent to sign in; a program that reads data is told that it has to. */
const unsigned = (event: RequestEvent, signIn: string): Response =>
	event.request.headers.get('accept')?.includes('text/html') ||
	event.request.headers.has('x-sveltekit-action')
		? elsewhere(event, signIn)
		: plainAnswer(event, 401, 'Sign in first.');

function signInPath({ request, url }: RequestEvent): string {
	const to = request.method === 'GET' ? url.pathname + url.search : url.pathname;
	return `/sign-in?to=${encodeURIComponent(to)}`;
}

/** Reading a page, as the browser or the framework's own navigation does. */
const isPageRead = ({ request, isDataRequest }: RequestEvent): boolean =>
	isDataRequest ||
	(request.method === 'GET' && (request.headers.get('accept') ?? '').includes('text/html'));
