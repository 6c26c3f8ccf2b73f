import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { dropRecut } from '$lib/server/services/recut-work.service';

export const POST = apiRoute(operations.dropRecut, async (member, { params }) => {
	const [sheet, recut] = [Number(params.sheet), Number(params.recut)];
	await dropRecut(workshop(), member, sheet, recut);
	return jsonResponse(JSON.stringify({ number: recut }));
});

export const fallback = notAllowed('POST');
