import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { editionChanges } from '$lib/server/services/edition-changes.service';
import type { RequestHandler } from './$types';

export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	const { sheet, number } = params;
	const read = () => editionChanges(workshop(), member, Number(sheet), Number(number));
	return json(await forPage(read));
}) satisfies RequestHandler;
