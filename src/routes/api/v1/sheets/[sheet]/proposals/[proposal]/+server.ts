import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { proposalAnswer } from '$lib/server/api/territory-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { readProposal } from '$lib/server/services/proposals.service';

export const GET = apiRoute(operations.readProposal, async (member, { params }) => {
	const [sheet, proposal] = [Number(params.sheet), Number(params.proposal)];
	const { opened, result, keys } = await readProposal(workshop(), member, sheet, proposal);
	return jsonResponse(JSON.stringify(proposalAnswer(opened, result, keys)));
});

export const fallback = notAllowed('GET');
