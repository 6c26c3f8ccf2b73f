import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { checkBoundaries } from '$lib/server/services/check.service';

export const POST = apiRoute(operations.checkBoundaries, async (_member, { request }) => {
	const { body, status } = await checkBoundaries(workshop(), request);
	return jsonResponse(body, status);
});

export const fallback = notAllowed('POST');
