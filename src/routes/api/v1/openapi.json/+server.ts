import { json } from '@sveltejs/kit';
import { openApi } from '$lib/server/api/openapi';
import { notAllowed } from '$lib/server/api/route';
import type { RequestHandler } from './$types';

/** The API's description; it says nothing of any team, so it needs no token. */
export const GET = (({ url }) => json(openApi(url.origin))) satisfies RequestHandler;

export const fallback = notAllowed('GET');
