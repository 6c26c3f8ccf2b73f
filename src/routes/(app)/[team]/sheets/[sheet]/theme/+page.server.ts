import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { themeMeasures } from '$lib/server/services/theme-figures.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return {
		themeMeasures: await forPage(() => themeMeasures(workshop(), member, Number(params.sheet))),
	};
}) satisfies PageServerLoad;
