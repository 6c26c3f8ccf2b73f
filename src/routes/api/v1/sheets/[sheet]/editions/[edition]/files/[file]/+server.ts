import { operations } from '$lib/schemas/api/operations';
import { apiRoute, notAllowed } from '$lib/server/api/route';
import { editionFileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { editionFile } from '$lib/server/services/edition.service';

export const GET = apiRoute(operations.readEditionFile, async (member, { params, request }) => {
	const { sheet, edition, file: name } = params;
	const file = await editionFile(workshop(), member, Number(sheet), Number(edition), name);
	return editionFileResponse(request, file);
});

export const fallback = notAllowed('GET');
