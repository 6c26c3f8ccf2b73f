import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { recutStatus } from '$lib/server/services/recuts.service';
import type { RequestHandler } from './$types';

export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	const [sheet, recut] = [Number(params.sheet), Number(params.recut)];
	return json(await forPage(() => recutStatus(workshop(), member, sheet, recut)));
}) satisfies RequestHandler;
