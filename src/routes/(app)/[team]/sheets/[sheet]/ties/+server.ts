import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetTies } from '$lib/server/services/ties.service';
import type { RequestHandler } from './$types';

/** The sheets that this one could be tied to and how its ties stand, as `SheetTies`. */
export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return json(await forPage(() => sheetTies(workshop(), member, Number(params.sheet))));
}) satisfies RequestHandler;
