import { operations } from '$lib/schemas/api/operations';
import { apiRoute, notAllowed } from '$lib/server/api/route';
import { fileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { borderFile, borderFormat } from '$lib/server/services/border-files.service';

export const GET = apiRoute(operations.readBorderFile, async (member, { params, request }) => {
	const format = borderFormat(params.file);
	const { signal } = request;
	return fileResponse(await borderFile(workshop(), member, Number(params.sheet), format, signal));
});

export const fallback = notAllowed('GET');
