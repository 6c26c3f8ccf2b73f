import { redirect } from '@sveltejs/kit';
import { boothCookie, boothCookieDays, readBooth } from '$lib/state/booth';
import type { RequestHandler } from './$types';

/** The booth switch without JavaScript: sets the cookie and returns to the page it came from. */
export const POST = (async ({ request, cookies, url }) => {
	const booth = readBooth((await request.formData()).get('booth'));
	if (booth) {
		cookies.set(boothCookie, booth, {
			path: '/',
			maxAge: boothCookieDays * 86_400,
			httpOnly: false,
			sameSite: 'lax',
		});
	}
	redirect(303, pageOnThisSite(request.headers.get('referer'), url.origin));
}) satisfies RequestHandler;

function pageOnThisSite(referer: string | null, origin: string): string {
	if (!referer || !URL.canParse(referer)) return '/';
	const from = new URL(referer);
	return from.origin === origin ? from.pathname + from.search : '/';
}
