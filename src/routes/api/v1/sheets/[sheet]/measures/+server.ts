import { operations } from '$lib/schemas/api/operations';
import { measureAnswer } from '$lib/server/api/measure-answers';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { deskMeasures } from '$lib/server/services/measures.service';

export const GET = apiRoute(operations.listMeasures, async (member, { params }) => {
	const { measures } = await deskMeasures(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ measures: measures.map(measureAnswer) }));
});

export const fallback = notAllowed('GET');
