import { error } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { coverageResponse } from '$lib/server/coverage-response';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { displayLevel } from '$lib/schemas/display-level';
import { sheetGeometry } from '$lib/server/services/sheet.service';
import type { RequestHandler } from './$types';

/**
 * The coverage in the encoding of the boundaries engine, whole or with `?level=n` thinned for the screen;
 * its tag is made of the boundary set and the level, which never change.
 */
export const GET = (async ({ locals, params, request, url }) => {
	const member = memberFor(locals, 'sheet.read');
	const level = displayLevel.safeParse(url.searchParams.get('level'));
	if (!level.success) error(400, 'A level of display is a whole number from 1.');
	const geometry = await forPage(() =>
		sheetGeometry(workshop(), member, Number(params.sheet), level.data),
	);
	return coverageResponse(request, geometry);
}) satisfies RequestHandler;
