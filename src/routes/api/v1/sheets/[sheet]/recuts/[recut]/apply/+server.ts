import { operations } from '$lib/schemas/api/operations';
import { recutApplying } from '$lib/schemas/api/recuts';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { applyRecut } from '$lib/server/services/recut-apply.service';

export const POST = apiRoute(operations.applyRecut, async (member, { params, request }) => {
	const { revision } = parseJson(await jsonBytes(request), recutApplying);
	const [sheet, recut] = [Number(params.sheet), Number(params.recut)];
	const applied = await applyRecut(workshop(), member, sheet, recut, revision);
	return jsonResponse(JSON.stringify(applied));
});

export const fallback = notAllowed('POST');
