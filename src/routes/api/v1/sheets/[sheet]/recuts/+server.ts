import { operations } from '$lib/schemas/api/operations';
import { recutNoteAnswer } from '$lib/server/api/recut-answer';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { beginFileRecut } from '$lib/server/services/recut-begin.service';
import { sheetRecuts } from '$lib/server/services/recuts.service';

export const GET = apiRoute(operations.listRecuts, async (member, { params }) => {
	const rows = await sheetRecuts(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ recuts: rows.map(recutNoteAnswer) }));
});

export const POST = apiRoute(operations.beginRecut, async (member, { params, request }) => {
	const { number } = await beginFileRecut(workshop(), member, Number(params.sheet), request);
	const location = `/api/v1/sheets/${params.sheet}/recuts/${number}`;
	return jsonResponse(JSON.stringify({ number }), 202, { location });
});

export const fallback = notAllowed('GET', 'POST');
