import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { intakeAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { beginIntake, intakeStatus } from '$lib/server/services/intake.service';
import { sheetList } from '$lib/server/services/sheet.service';

export const GET = apiRoute(operations.listSheets, async (member) =>
	jsonResponse(JSON.stringify({ sheets: await sheetList(workshop(), member) })),
);

export const POST = apiRoute(operations.uploadSheet, async (member, { request }) => {
	const { id } = await beginIntake(workshop(), member, request);
	const intake = intakeAnswer(await intakeStatus(workshop(), member, id));
	return jsonResponse(JSON.stringify(intake), 202, { location: `/api/v1/intakes/${id}` });
});

export const fallback = notAllowed('GET', 'POST');
