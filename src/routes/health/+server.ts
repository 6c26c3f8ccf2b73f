import { json } from '@sveltejs/kit';
import { health } from '$lib/server/services/health.service';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async () => {
	const state = await health();
	const headers = { 'cache-control': 'no-store' };
	return json(state, { status: state.status === 'ok' ? 200 : 503, headers });
};
