import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { intakeAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { intakeStatus } from '$lib/server/services/intake.service';

export const GET = apiRoute(operations.readIntake, async (member, { params }) => {
	const intake = await intakeStatus(workshop(), member, params.intake);
	return jsonResponse(JSON.stringify(intakeAnswer(intake)));
});

export const fallback = notAllowed('GET');
