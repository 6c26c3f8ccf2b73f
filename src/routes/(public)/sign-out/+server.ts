import { redirect } from '@sveltejs/kit';
import { clearSessionCookie, currentSession } from '$lib/server/hooks/session';
import { endSession } from '$lib/server/services/sessions.service';
import type { RequestHandler } from './$types';

export const POST: RequestHandler = async (event) => {
	await endSession(currentSession(event));
	clearSessionCookie(event);
	redirect(303, '/');
};
