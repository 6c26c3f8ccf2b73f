import { error, redirect, type Handle, type RequestEvent } from '@sveltejs/kit';
import { isTeamSlug } from '../access/reserved.ts';
import { membership } from '../services/teams.service.ts';

/**
 * Nobody comes past here unsigned into the working part of the product, and nobody into a team that is not
 * theirs. It stands before loads, form actions and handlers alike: a form's action runs no layout's load.
 */
export const handleGuard: Handle = async ({ event, resolve }) => {
	const route = event.route.id ?? '';
	if (!route.startsWith('/(app)')) return resolve(event);
	if (!event.locals.user) return toSignIn(event);
	if (route.startsWith('/(app)/[team]')) {
		const slug = event.params.team ?? '';
		event.locals.member = isTeamSlug(slug) ? await membership(slug, event.locals.user.id) : null;
		// For pages the loads say so, because they can show it as a page.
		if (!event.locals.member && !isPageRead(event)) error(404, 'There is no such team here.');
	}
	return resolve(event);
};

function toSignIn(event: RequestEvent): never {
	const { request, url } = event;
	const form = request.method === 'POST' && request.headers.has('x-sveltekit-action');
	if (!form && !isPageRead(event) && request.method !== 'POST') {
		error(401, 'Sign in first.');
	}
	const to = request.method === 'GET' ? url.pathname + url.search : url.pathname;
	redirect(303, `/sign-in?to=${encodeURIComponent(to)}`);
}

/** Reading a page, as the browser or the framework's own navigation does. */
const isPageRead = ({ request, isDataRequest }: RequestEvent): boolean =>
	isDataRequest ||
	(request.method === 'GET' && (request.headers.get('accept') ?? '').includes('text/html'));
