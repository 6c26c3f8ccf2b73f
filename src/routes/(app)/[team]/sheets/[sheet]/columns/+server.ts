import { memberFor } from '$lib/server/access/guard';
import { gzipped, isHeld, notModified } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetColumns } from '$lib/server/services/sheet-columns.service';
import type { RequestHandler } from './$types';

/** Regions and borders of a large sheet as bytes, which a browser that holds them need not fetch again. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const columns = await forPage(() => sheetColumns(workshop(), member, Number(params.sheet)));
	// the address outlives the boundary set, so the browser asks, and is mostly told that it has it
	const headers = { 'cache-control': 'private, no-cache' };
	if (isHeld(request, columns.tag)) return notModified(columns.tag, headers);
	return gzipped(request, await forPage(() => columns.read()), {
		...headers,
		etag: `"${columns.tag}"`,
		'content-type': 'application/octet-stream',
	});
}) satisfies RequestHandler;
