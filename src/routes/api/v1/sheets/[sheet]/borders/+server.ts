import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { bordersAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { deskSheet } from '$lib/server/services/sheet.service';

export const GET = apiRoute(operations.readBorders, async (member, { params }) => {
	const sheet = await deskSheet(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify(bordersAnswer(sheet)));
});

export const fallback = notAllowed('GET');
