import { operations } from '$lib/schemas/api/operations';
import { recutAnswer } from '$lib/server/api/recut-answer';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { readRecut } from '$lib/server/services/recuts.service';

export const GET = apiRoute(operations.readRecut, async (member, { params }) => {
	const [sheet, recut] = [Number(params.sheet), Number(params.recut)];
	return jsonResponse(
		JSON.stringify(recutAnswer(await readRecut(workshop(), member, sheet, recut))),
	);
});

export const fallback = notAllowed('GET');
