import { operations } from '$lib/schemas/api/operations';
import { answer } from '$lib/schemas/api/sheets';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { intakeAnswer } from '$lib/server/api/sheet-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { answerIntake } from '$lib/server/services/intake-answer.service';
import { intakeStatus } from '$lib/server/services/intake.service';

export const POST = apiRoute(operations.answerIntake, async (member, { params, request }) => {
	const sent = parseJson(await jsonBytes(request), answer);
	await answerIntake(workshop(), member, params.intake, sent);
	const intake = await intakeStatus(workshop(), member, params.intake);
	return jsonResponse(JSON.stringify(intakeAnswer(intake)), 202);
});

export const fallback = notAllowed('POST');
