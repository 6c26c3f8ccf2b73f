import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetSearches } from '$lib/server/services/searches.service';
import type { RequestHandler } from './$types';

/** How far longer tries are, as `SearchNote[]`, the newest first: for asking again and again. */
export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return json(await forPage(() => sheetSearches(workshop(), member, Number(params.sheet))));
}) satisfies RequestHandler;
