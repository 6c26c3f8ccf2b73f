import { error } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { gzipped, isHeld, notModified } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { pictureTag } from '$lib/schemas/first-picture';
import { sheetFirstPicture } from '$lib/server/services/first-picture.service';
import type { RequestHandler } from './$types';

/**
 * The coarse picture that a large sheet shows first, as bytes under the tag that its page was given: what a
 * tag names never changes, so that a browser that holds it need not ask.
 */
export const GET = (async ({ locals, params, request, url }) => {
	const member = memberFor(locals, 'sheet.read');
	const tag = pictureTag.safeParse(url.searchParams.get('tag'));
	if (!tag.success) error(400, 'A picture is named by the tag that its sheet was given.');
	const headers = { 'cache-control': 'private, max-age=31536000, immutable' };
	const number = Number(params.sheet);
	const picture = await forPage(() => sheetFirstPicture(workshop(), member, number, tag.data));
	if (picture.byteLength === 0) return new Response(null, { status: 204, headers });
	if (isHeld(request, tag.data)) return notModified(tag.data, headers);
	return gzipped(request, picture, {
		...headers,
		etag: `"${tag.data}"`,
		'content-type': 'application/octet-stream',
	});
}) satisfies RequestHandler;
