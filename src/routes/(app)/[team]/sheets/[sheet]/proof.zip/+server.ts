import { memberFor } from '$lib/server/access/guard';
import { fileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { proofAsked, sheetProof } from '$lib/server/services/proof.service';
import type { RequestHandler } from './$types';

/** The same proof in open forms: graph, clauses and refutation. */
export const GET = (async ({ locals, params, request, url }) => {
	const member = memberFor(locals, 'sheet.read');
	const asked = proofAsked(url, 'zip');
	return fileResponse(
		await forPage(() =>
			sheetProof(workshop(), member, Number(params.sheet), asked, request.signal),
		),
	);
}) satisfies RequestHandler;
