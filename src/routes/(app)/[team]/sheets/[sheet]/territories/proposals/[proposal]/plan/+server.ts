import { error, json } from '@sveltejs/kit';
import { savePlan } from '$lib/schemas/territories';
import { memberFor } from '$lib/server/access/guard';
import { jsonOf } from '$lib/server/api/read-json';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { editProposal } from '$lib/server/services/proposal-plan.service';
import type { RequestHandler } from './$types';

/** Saves edits by hand: 200 `PlanSaved`, or 409 `PlanStale` when somebody else edited the plan first. */
export const POST = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'territories.edit');
	const sent = savePlan.safeParse(await jsonOf(request));
	if (!sent.success) {
		const [issue] = sent.error.issues;
		error(400, `The plan was not understood: ${issue.path.join('.')} ${issue.message}`);
	}
	const [sheet, proposal] = [Number(params.sheet), Number(params.proposal)];
	const edit = () => editProposal(workshop(), member, sheet, proposal, sent.data);
	const result = await forPage(edit);
	return result.status === 'saved' ? json(result.saved) : json(result.stale, { status: 409 });
}) satisfies RequestHandler;
