import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { colouringAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { deskSheet } from '$lib/server/services/sheet.service';

export const GET = apiRoute(operations.readColouring, async (member, { params }) => {
	const sheet = await deskSheet(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify(colouringAnswer(sheet)));
});

export const fallback = notAllowed('GET');
