import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { sheetAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { deskSheet } from '$lib/server/services/sheet.service';

export const GET = apiRoute(operations.readSheet, async (member, { params }) => {
	const sheet = await deskSheet(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify(sheetAnswer(sheet)));
});

export const fallback = notAllowed('GET');
