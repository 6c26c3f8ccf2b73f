import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetPieces } from '$lib/server/services/pieces.service';
import type { RequestHandler } from './$types';

/** The pieces of the sheet's regions, asked for when somebody opens their list. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const number = Number(params.sheet);
	const pieces = await forPage(() => sheetPieces(workshop(), member, number, request.signal));
	return json(pieces, { headers: { 'cache-control': 'private, no-cache' } });
}) satisfies RequestHandler;
