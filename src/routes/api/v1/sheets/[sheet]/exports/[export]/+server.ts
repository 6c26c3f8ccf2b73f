import { operations } from '$lib/schemas/api/operations';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { readExport } from '$lib/server/services/exports.service';

export const GET = apiRoute(operations.readExport, async (member, { params }) => {
	const [sheet, one] = [Number(params.sheet), Number(params.export)];
	return jsonResponse(JSON.stringify(await readExport(workshop(), member, sheet, one)));
});

export const fallback = notAllowed('GET');
