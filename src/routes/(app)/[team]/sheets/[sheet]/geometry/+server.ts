import { memberFor } from '$lib/server/access/guard';
import { coverageResponse } from '$lib/server/coverage-response';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetGeometry } from '$lib/server/services/sheet.service';
import type { RequestHandler } from './$types';

/** The coverage in the encoding of the boundaries engine; its tag is the boundary set, which never changes. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const geometry = await forPage(() => sheetGeometry(workshop(), member, Number(params.sheet)));
	return coverageResponse(request, geometry);
}) satisfies RequestHandler;
