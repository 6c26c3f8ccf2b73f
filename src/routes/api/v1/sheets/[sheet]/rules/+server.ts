import { operations } from '$lib/schemas/api/operations';
import { saveDraft as sentDraft } from '$lib/schemas/draft';
import { ApiFault } from '$lib/server/api/fault';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { saveDraft } from '$lib/server/services/draft.service';
import { deskSheet } from '$lib/server/services/sheet.service';

export const GET = apiRoute(operations.readRules, async (member, { params }) => {
	const sheet = await deskSheet(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify({ revision: sheet.revision, document: sheet.draft }));
});

export const PUT = apiRoute(operations.saveRules, async (member, { params, request }) => {
	const sent = parseJson(await jsonBytes(request), sentDraft);
	const result = await saveDraft(workshop(), member, Number(params.sheet), sent);
	if (result.status === 'stale') {
		throw new ApiFault(409, 'stale', 'somebody else saved first', { ...result.stale });
	}
	const { revision, savedAt } = result.saved;
	return jsonResponse(JSON.stringify({ revision, savedAt }));
});

export const fallback = notAllowed('GET', 'PUT');
