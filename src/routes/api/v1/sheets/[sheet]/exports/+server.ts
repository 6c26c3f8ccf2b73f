import { operations } from '$lib/schemas/api/operations';
import { askExport } from '$lib/schemas/export';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { askForExport, sheetExports } from '$lib/server/services/exports.service';

export const GET = apiRoute(operations.listExports, async (member, { params }) => {
	const exports = await sheetExports(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ exports }));
});

export const POST = apiRoute(operations.askExport, async (member, { params, request }) => {
	const wanted = parseJson(await jsonBytes(request), askExport);
	const note = await askForExport(workshop(), member, Number(params.sheet), wanted);
	return jsonResponse(JSON.stringify(note), 202);
});

export const fallback = notAllowed('GET', 'POST');
