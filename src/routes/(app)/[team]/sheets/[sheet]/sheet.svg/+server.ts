import { error } from '@sveltejs/kit';
import { readers, type Reader } from '$lib/engines/palettes/palette';
import { memberFor } from '$lib/server/access/guard';
import { attachment, gzipped, isHeld, notModified, svgPolicy } from '$lib/server/bytes';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { draftSvg } from '$lib/server/services/drawing.service';
import type { RequestHandler } from './$types';

/** The current draft as a file; `?reader=` as one kind of reader sees it, `?download` to be kept. */
export const GET = (async ({ locals, params, request, url }) => {
	const member = memberFor(
		locals,
		url.searchParams.has('download') ? 'files.download' : 'sheet.read',
	);
	const reader = (url.searchParams.get('reader') ?? 'typical') as Reader;
	if (!readers.includes(reader)) error(400, `A reader is one of ${readers.join(', ')}.`);
	const svg = await forPage(() => draftSvg(workshop(), member, Number(params.sheet), reader));
	const headers: Record<string, string> = {
		etag: `"${svg.tag}"`,
		'cache-control': 'private, no-cache',
		'content-type': 'image/svg+xml',
		'content-security-policy': svgPolicy,
	};
	if (isHeld(request, svg.tag)) return notModified(svg.tag, headers);
	if (url.searchParams.has('download')) headers['content-disposition'] = attachment(svg.fileName);
	return gzipped(request, await forPage(() => svg.paint(request.signal)), headers);
}) satisfies RequestHandler;
