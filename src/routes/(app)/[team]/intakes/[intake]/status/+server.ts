import { json } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { intakeStatus } from '$lib/server/services/intake.service';
import type { RequestHandler } from './$types';

export const GET = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return json(await forPage(() => intakeStatus(workshop(), member, params.intake)));
}) satisfies RequestHandler;
