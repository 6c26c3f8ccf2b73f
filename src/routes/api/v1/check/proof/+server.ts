import { operations } from '$lib/schemas/api/operations';
import { jsonBytes } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { checkProof } from '$lib/server/services/check.service';

export const POST = apiRoute(operations.checkProof, async (_member, { request }) => {
	const bytes = await jsonBytes(request);
	const { body, status } = await checkProof(workshop(), bytes, request.signal);
	return jsonResponse(body, status);
});

export const fallback = notAllowed('POST');
