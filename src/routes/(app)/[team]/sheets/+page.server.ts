import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { sheetList } from '$lib/server/services/sheet.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	return { sheets: await forPage(() => sheetList(workshop(), member)) };
}) satisfies PageServerLoad;
