import { operations } from '$lib/schemas/api/operations';
import { recutPuttingBack } from '$lib/schemas/api/recuts';
import { jsonBytes, parseJson } from '$lib/server/api/read-json';
import { apiRoute, jsonResponse, notAllowed } from '$lib/server/api/route';
import { workshop } from '$lib/server/jobs/workshop';
import { putBackRecut } from '$lib/server/services/recut-put-back.service';

export const POST = apiRoute(operations.putBackRecut, async (member, { params, request }) => {
	const { sure } = parseJson(await jsonBytes(request), recutPuttingBack);
	const [sheet, recut] = [Number(params.sheet), Number(params.recut)];
	const back = await putBackRecut(workshop(), member, sheet, recut, sure);
	return jsonResponse(JSON.stringify(back));
});

export const fallback = notAllowed('POST');
