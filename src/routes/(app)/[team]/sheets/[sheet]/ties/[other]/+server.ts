import { error, json } from '@sveltejs/kit';
import { tieQuery } from '$lib/schemas/ties';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { tieGround } from '$lib/server/services/ties.service';
import type { RequestHandler } from './$types';

/** What a tie to another sheet would ask, as `TieGround`; `?within=` metres. */
export const GET = (async ({ locals, params, url, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const query = tieQuery.safeParse(Object.fromEntries(url.searchParams));
	if (!query.success) error(400, 'Edges are compared within 0.01 to 1,000 metres.');
	const to = { sheet: Number(params.other), within: query.data.within };
	const ground = () => tieGround(workshop(), member, Number(params.sheet), to, request.signal);
	return json(await forPage(ground));
}) satisfies RequestHandler;
