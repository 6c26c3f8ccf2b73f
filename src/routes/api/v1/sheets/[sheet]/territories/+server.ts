import { operations } from '$lib/schemas/api/operations';
import { saveTerritories as sentTerritories } from '$lib/schemas/territories';
import { ApiFault } from '$lib/server/api/fault';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { territoriesAnswer } from '$lib/server/api/territory-answers';
import { workshop } from '$lib/server/jobs/workshop';
import { deskTerritories, saveTerritories } from '$lib/server/services/territories.service';

export const GET = apiRoute(operations.readTerritories, async (member, { params }) => {
	const territories = await deskTerritories(workshop(), member, Number(params.sheet));
	return jsonResponse(JSON.stringify(territoriesAnswer(territories)));
});

export const PUT = apiRoute(operations.saveTerritories, async (member, { params, request }) => {
	const sent = parseJson(await jsonBytes(request), sentTerritories);
	const result = await saveTerritories(workshop(), member, Number(params.sheet), sent);
	if (result.status === 'stale') {
		throw new ApiFault(409, 'stale', 'somebody else saved first', { ...result.stale });
	}
	const { revision, savedAt, inks, inkNote, changedInks } = result.saved;
	return jsonResponse(JSON.stringify({ revision, savedAt, inks, inkNote, changedInks }));
});

export const fallback = notAllowed('GET', 'PUT');
