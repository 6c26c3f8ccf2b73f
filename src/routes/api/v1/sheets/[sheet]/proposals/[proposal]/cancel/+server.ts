import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { cancelProposal } from '$lib/server/services/proposal-keep.service';

export const POST = apiRoute(operations.cancelProposal, async (member, { params }) => {
	const [sheet, proposal] = [Number(params.sheet), Number(params.proposal)];
	await cancelProposal(workshop(), member, sheet, proposal);
	return jsonResponse(JSON.stringify({ number: proposal, state: 'cancelled' }));
});

export const fallback = notAllowed('POST');
