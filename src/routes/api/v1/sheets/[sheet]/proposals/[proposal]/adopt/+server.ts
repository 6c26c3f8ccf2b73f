import { operations } from '$lib/schemas/api/operations';
import { adoption } from '$lib/schemas/api/territories';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { adoptProposal } from '$lib/server/services/proposal-adopt.service';

export const POST = apiRoute(operations.adoptProposal, async (member, { params, request }) => {
	const sent = parseJson(await jsonBytes(request), adoption);
	const [sheet, proposal] = [Number(params.sheet), Number(params.proposal)];
	const { revision } = await adoptProposal(workshop(), member, sheet, proposal, sent);
	return jsonResponse(JSON.stringify({ revision }));
});

export const fallback = notAllowed('POST');
