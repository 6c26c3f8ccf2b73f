import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { revisionInks } from '$lib/server/services/earlier-inks.service';
import type { RequestHandler } from './$types';

export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	const { sheet, revision } = params;
	const read = () => revisionInks(workshop(), member, Number(sheet), Number(revision));
	return json(await forPage(read));
}) satisfies RequestHandler;
