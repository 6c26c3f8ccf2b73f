import { memberFor } from '$lib/server/access/guard';
import { fileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { rulesFile } from '$lib/server/services/rules-csv.service';
import type { RequestHandler } from './$types';

/** The rules of the sheet's draft as it was saved last, as CSV. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const number = Number(params.sheet);
	return fileResponse(await forPage(() => rulesFile(workshop(), member, number, request.signal)));
}) satisfies RequestHandler;
