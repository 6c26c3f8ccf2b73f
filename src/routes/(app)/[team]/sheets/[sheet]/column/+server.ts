import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { columnOfSheet } from '$lib/server/services/column-values.service';
import type { RequestHandler } from './$types';

/** What one column of the boundary file says of every region, asked for when rules are made by it. */
export const GET = (async ({ locals, params, url }) => {
	const member = memberFor(locals, 'sheet.read');
	const name = url.searchParams.get('name') ?? '';
	const number = Number(params.sheet);
	const column = await forPage(() => columnOfSheet(workshop(), member, number, name));
	return json(column, { headers: { 'cache-control': 'private, no-cache' } });
}) satisfies RequestHandler;
