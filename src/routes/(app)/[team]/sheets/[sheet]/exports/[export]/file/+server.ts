import { memberFor } from '$lib/server/access/guard';
import { storedFileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { exportFileOf } from '$lib/server/services/exports.service';
import type { RequestHandler } from './$types';

/** A file that was made of an edition or a draft, to be kept. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'files.download');
	const [sheet, one] = [Number(params.sheet), Number(params.export)];
	return forPage(async () =>
		storedFileResponse(request, await exportFileOf(workshop(), member, sheet, one)),
	);
}) satisfies RequestHandler;
