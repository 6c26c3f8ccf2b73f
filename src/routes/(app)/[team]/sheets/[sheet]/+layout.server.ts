import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetForPage } from '$lib/server/services/sheet-columns.service';
import type { LayoutServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	const sheet = await forPage(() => sheetForPage(workshop(), member, Number(params.sheet)));
	return { sheet };
}) satisfies LayoutServerLoad;
