import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { proposalProgress } from '$lib/server/services/proposals.service';
import type { RequestHandler } from './$types';

/** How far proposals are, as `ProposalProgress[]`: those at work, and those that ended in the last minutes. */
export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'measures.read');
	const number = Number(params.sheet);
	return json(await forPage(() => proposalProgress(workshop(), member, number)));
}) satisfies RequestHandler;
