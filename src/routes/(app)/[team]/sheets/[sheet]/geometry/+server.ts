import { memberFor } from '$lib/server/access/guard';
import { isHeld, notModified } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetGeometry } from '$lib/server/services/sheet.service';
import type { RequestHandler } from './$types';

/** The coverage in the encoding of the boundaries engine; its tag is the boundary set, which never changes. */
export const GET = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const geometry = await forPage(() => sheetGeometry(workshop(), member, Number(params.sheet)));
	// the address outlives the boundary set, so the browser asks, and is mostly told that it has it
	const headers = { 'cache-control': 'private, no-cache' };
	if (isHeld(request, geometry.tag)) return notModified(geometry.tag, headers);
	const bytes = await forPage(() => geometry.read());
	return new Response(bytes as Uint8Array<ArrayBuffer>, {
		headers: {
			...headers,
			etag: `"${geometry.tag}"`,
			'content-type': 'application/octet-stream',
			'content-length': String(bytes.byteLength),
		},
	});
}) satisfies RequestHandler;
