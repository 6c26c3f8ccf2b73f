import { beginSearchForm, stopSearchForm } from '$lib/schemas/search';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { beginSearch, sheetSearches, stopSearch } from '$lib/server/services/searches.service';
import type { Actions, PageServerLoad } from './$types';

/** Longer tries for what the colouring leaves open, the newest first. */
export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return {
		searches: await forPage(() => sheetSearches(workshop(), member, Number(params.sheet))),
	};
}) satisfies PageServerLoad;

/** Both answer `FormProblem` on failure. */
export const actions = {
	longer: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'colours.edit');
		const form = await readForm(request, beginSearchForm);
		if (form.failure) return form.failure;
		const begin = () => beginSearch(workshop(), member, Number(params.sheet), form.data);
		return (await attempt(begin)).failure;
	},
	stop: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'colours.edit');
		const form = await readForm(request, stopSearchForm);
		if (form.failure) return form.failure;
		const stop = () => stopSearch(workshop(), member, Number(params.sheet), form.data.search);
		return (await attempt(stop)).failure;
	},
} satisfies Actions;
