import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { readSearch } from '$lib/server/services/searches.service';
import type { RequestHandler } from './$types';

/** One longer try with the inks that it found, as `SearchFound`. */
export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	const [number, search] = [Number(params.sheet), Number(params.search)];
	return json(await forPage(() => readSearch(workshop(), member, number, search)));
}) satisfies RequestHandler;
