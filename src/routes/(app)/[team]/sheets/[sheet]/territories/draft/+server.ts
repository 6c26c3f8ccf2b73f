import { error, json } from '@sveltejs/kit';
import { saveTerritories as sentTerritories } from '$lib/schemas/territories';
import { memberFor } from '$lib/server/access/guard';
import { jsonOf } from '$lib/server/api/read-json';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { saveTerritories } from '$lib/server/services/territories.service';
import type { RequestHandler } from './$types';

/** Saves the territories: 200 `TerritoriesSaved`, or 409 `TerritoriesStale` when somebody else saved first. */
export const POST = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'territories.edit');
	const sent = sentTerritories.safeParse(await jsonOf(request));
	if (!sent.success) {
		const [issue] = sent.error.issues;
		error(400, `The territories were not understood: ${issue.path.join('.')} ${issue.message}`);
	}
	const save = () => saveTerritories(workshop(), member, Number(params.sheet), sent.data);
	const result = await forPage(save);
	return result.status === 'saved' ? json(result.saved) : json(result.stale, { status: 409 });
}) satisfies RequestHandler;
