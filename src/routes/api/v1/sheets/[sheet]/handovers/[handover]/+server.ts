import { operations } from '$lib/schemas/api/operations';
import { handoverAnswer } from '$lib/server/api/handover-answer';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { readHandover } from '$lib/server/services/handover.service';

export const GET = apiRoute(operations.readHandover, async (member, { params }) => {
	const { sheet, handover } = params;
	const list = await readHandover(workshop(), member, Number(sheet), Number(handover));
	return jsonResponse(JSON.stringify(handoverAnswer(list)));
});

export const fallback = notAllowed('GET');
