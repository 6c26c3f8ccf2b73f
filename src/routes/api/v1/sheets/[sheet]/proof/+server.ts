import { operations } from '$lib/schemas/api/operations';
import { apiRoute, notAllowed } from '$lib/server/api/route';
import { fileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { proofAsked, sheetProof } from '$lib/server/services/proof.service';

export const GET = apiRoute(operations.readProof, async (member, { params, request, url }) => {
	const asked = proofAsked(url, 'json');
	const number = Number(params.sheet);
	return fileResponse(await sheetProof(workshop(), member, number, asked, request.signal));
});

export const fallback = notAllowed('GET');
