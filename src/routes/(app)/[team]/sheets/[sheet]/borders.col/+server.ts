import { memberFor } from '$lib/server/access/guard';
import { fileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { borderFile } from '$lib/server/services/border-files.service';
import type { RequestHandler } from './$types';

/** The borders that count as a graph in the DIMACS .col form. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const number = Number(params.sheet);
	return fileResponse(
		await forPage(() => borderFile(workshop(), member, number, 'col', request.signal)),
	);
}) satisfies RequestHandler;
