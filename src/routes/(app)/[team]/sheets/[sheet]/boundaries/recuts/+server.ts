import { error, json, redirect } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { UploadFault } from '$lib/server/files/multipart';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { beginFileRecut } from '$lib/server/services/recut-begin.service';
import type { RequestHandler } from './$types';

/**
 * Takes in another file of boundaries for a sheet. The form is read as it arrives: the file goes to the disk
 * and is never held in memory. A browser's own form is sent on to the page of the re-cut.
 */
export const POST = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'boundaries.upload');
	const { number } = await forPage(() =>
		beginFileRecut(workshop(), member, Number(params.sheet), request).catch(notTaken),
	);
	const url = `/${params.team}/sheets/${params.sheet}/boundaries/recuts/${number}`;
	if (/text\/html/.test(request.headers.get('accept') ?? '')) redirect(303, url);
	return json({ number, url }, { status: 202 });
}) satisfies RequestHandler;

function notTaken(problem: unknown): never {
	if (problem instanceof UploadFault) error(problem.status, problem.message);
	throw problem;
}
