import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { handoverList } from '$lib/server/services/handover.service';

export const GET = apiRoute(operations.listHandovers, async (member, { params }) => {
	const { lists } = await handoverList(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ handovers: lists }));
});

export const fallback = notAllowed('GET');
