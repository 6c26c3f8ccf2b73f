import { operations } from '$lib/schemas/api/operations';
import { beginSearch as asked } from '$lib/schemas/search';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { beginSearch, sheetSearches } from '$lib/server/services/searches.service';

export const GET = apiRoute(operations.listSearches, async (member, { params }) => {
	const searches = await sheetSearches(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ searches }));
});

export const POST = apiRoute(operations.beginSearch, async (member, { params, request }) => {
	const wanted = parseJson(await jsonBytes(request), asked);
	const begun = await beginSearch(workshop(), member, Number(params.sheet), wanted);
	return jsonResponse(JSON.stringify(begun), 202);
});

export const fallback = notAllowed('GET', 'POST');
