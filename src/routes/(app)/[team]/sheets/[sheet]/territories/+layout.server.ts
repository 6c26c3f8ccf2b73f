import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { deskTerritories } from '$lib/server/services/territories.service';
import type { LayoutServerLoad } from './$types';

/** `DeskTerritories` as `territories`, for every place of the stage that stands on the desk. */
export const load = (async ({ locals, params, depends }) => {
	const member = memberFor(locals, 'measures.read');
	depends('merestone:territories');
	const number = Number(params.sheet);
	return { territories: await forPage(() => deskTerritories(workshop(), member, number)) };
}) satisfies LayoutServerLoad;
