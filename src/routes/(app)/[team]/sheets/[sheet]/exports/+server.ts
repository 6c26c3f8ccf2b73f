import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetExports } from '$lib/server/services/exports.service';
import type { RequestHandler } from './$types';

/** How far files are, as `ExportNote[]`, the newest first: for asking again and again. */
export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'files.download');
	return json(await forPage(() => sheetExports(workshop(), member, Number(params.sheet))));
}) satisfies RequestHandler;
