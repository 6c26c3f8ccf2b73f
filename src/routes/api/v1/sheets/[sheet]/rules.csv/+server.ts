import { operations } from '$lib/schemas/api/operations';
import { bodyBytes } from '$lib/server/api/body-bytes';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { fileResponse } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { replaceRulesByFile, rulesFile } from '$lib/server/services/rules-csv.service';

export const GET = apiRoute(operations.readRulesTable, async (member, { params, request }) =>
	fileResponse(await rulesFile(workshop(), member, Number(params.sheet), request.signal)),
);

export const PUT = apiRoute(operations.saveRulesTable, async (member, { params, request }) => {
	const bytes = await bodyBytes(request, 'text/csv');
	const number = Number(params.sheet);
	const saved = await replaceRulesByFile(workshop(), member, number, bytes, request.signal);
	return jsonResponse(JSON.stringify({ revision: saved.revision, savedAt: saved.savedAt }));
});

export const fallback = notAllowed('GET', 'PUT');
