import { operations } from '$lib/schemas/api/operations';
import { apiRoute, notAllowed } from '$lib/server/api/route';
import { storedFileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { exportFileOf } from '$lib/server/services/exports.service';

export const GET = apiRoute(operations.readExportFile, async (member, { params, request }) => {
	const [sheet, one] = [Number(params.sheet), Number(params.export)];
	return storedFileResponse(request, await exportFileOf(workshop(), member, sheet, one));
});

export const fallback = notAllowed('GET');
