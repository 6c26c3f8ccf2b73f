import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { sheetBordersAnswer } from '$lib/server/services/check.service';

export const GET = apiRoute(operations.readBorders, async (member, { params, request }) => {
	const number = Number(params.sheet);
	const { body, status } = await sheetBordersAnswer(workshop(), member, number, request.signal);
	return jsonResponse(body, status);
});

export const fallback = notAllowed('GET');
