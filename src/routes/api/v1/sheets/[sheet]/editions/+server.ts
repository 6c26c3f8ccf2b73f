import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { editionAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { sheetEditions } from '$lib/server/services/edition.service';

export const GET = apiRoute(operations.listEditions, async (member, { params }) => {
	const editions = await sheetEditions(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ editions: editions.map(editionAnswer) }));
});

export const fallback = notAllowed('GET');
