import { memberFor } from '$lib/server/access/guard';
import { coverageResponse } from '$lib/server/coverage-response';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { recutGeometry } from '$lib/server/services/recuts.service';
import type { RequestHandler } from './$types';

/** The coverage that was read or, with `?side=before`, the one that it was compared with. */
export const GET = (async ({ locals, params, request, url }) => {
	const member = memberFor(locals, 'sheet.read');
	const [sheet, recut] = [Number(params.sheet), Number(params.recut)];
	const side = url.searchParams.get('side') === 'before' ? 'before' : 'after';
	const geometry = await forPage(() => recutGeometry(workshop(), member, sheet, recut, side));
	return coverageResponse(request, geometry);
}) satisfies RequestHandler;
