import { measureSent } from '$lib/schemas/api/measures';
import { operations } from '$lib/schemas/api/operations';
import { measureAnswer } from '$lib/server/api/measure-answers';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { feedMeasure, measureByName } from '$lib/server/services/measure-feed.service';

export const GET = apiRoute(operations.readMeasure, async (member, { params }) => {
	const { sheet, measure: name } = params;
	const { measure, values } = await measureByName(workshop(), member, Number(sheet), name);
	return jsonResponse(JSON.stringify({ ...measureAnswer(measure), values }));
});

export const PUT = apiRoute(operations.saveMeasure, async (member, { params, request }) => {
	const sent = parseJson(await jsonBytes(request), measureSent);
	const { sheet, measure: name } = params;
	const { measure, change } = await feedMeasure(workshop(), member, Number(sheet), name, sent);
	return jsonResponse(JSON.stringify({ ...measureAnswer(measure), change }));
});

export const fallback = notAllowed('GET', 'PUT');
