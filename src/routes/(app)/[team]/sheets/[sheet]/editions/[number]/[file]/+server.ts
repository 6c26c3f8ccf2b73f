import { memberFor } from '$lib/server/access/guard';
import { editionFileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { editionFile } from '$lib/server/services/edition.service';
import type { RequestHandler } from './$types';

/** A file of an issued edition, byte for byte as it was issued. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'files.download');
	const { sheet, number, file: name } = params;
	return forPage(async () => {
		const file = await editionFile(workshop(), member, Number(sheet), Number(number), name);
		return editionFileResponse(request, file);
	});
}) satisfies RequestHandler;
