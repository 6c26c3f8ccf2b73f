import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { teamPalettes } from '$lib/server/services/palette.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	return { palettes: await forPage(() => teamPalettes(workshop(), member)) };
}) satisfies PageServerLoad;
