import { error, json } from '@sveltejs/kit';
import { exportsAsked } from '$lib/schemas/export';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { deskExports } from '$lib/server/services/exports.service';
import type { RequestHandler } from './$types';

/** How far files are, as `DeskExport[]`, the newest first: for asking again and again. */
export const GET = (async ({ locals, params, url }) => {
	const member = memberFor(locals, 'files.download');
	const asked = exportsAsked.safeParse(Object.fromEntries(url.searchParams));
	if (!asked.success) error(400, 'Files are named by their numbers.');
	const { of } = asked.data;
	return json(await forPage(() => deskExports(workshop(), member, Number(params.sheet), of)));
}) satisfies RequestHandler;
