import { operations } from '$lib/schemas/api/operations';
import { beginProposal as asked } from '$lib/schemas/territories';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { proposalNoteAnswer } from '$lib/server/api/territory-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { beginProposal, listOfProposals } from '$lib/server/services/proposals.service';

export const GET = apiRoute(operations.listProposals, async (member, { params }) => {
	const notes = await listOfProposals(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ proposals: notes.map(proposalNoteAnswer) }));
});

export const POST = apiRoute(operations.askProposal, async (member, { params, request }) => {
	const wanted = parseJson(await jsonBytes(request), asked);
	const { number } = await beginProposal(workshop(), member, Number(params.sheet), wanted);
	return jsonResponse(JSON.stringify({ number }), 202);
});

export const fallback = notAllowed('GET', 'POST');
