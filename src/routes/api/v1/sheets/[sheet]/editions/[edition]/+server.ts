import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { editionAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { readEdition } from '$lib/server/services/edition.service';

export const GET = apiRoute(operations.readEdition, async (member, { params }) => {
	const { sheet, edition } = params;
	const found = await readEdition(workshop(), member, Number(sheet), Number(edition));
	return jsonResponse(JSON.stringify(editionAnswer(found)));
});

export const fallback = notAllowed('GET');
