import { fromColumnForm, fromScratchForm } from '$lib/schemas/territory-forms';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import {
	assignFromColumn,
	assignFromScratch,
} from '$lib/server/services/territories-start.service';
import { savedOrStale } from '$lib/server/stale';
import type { Actions } from './$types';

/**
 * Fields of each form: see `schemas/territory-forms.ts`. Both answer `FormProblem` on failure, else the
 * `revision` that was saved.
 */
export const actions = {
	fromColumn: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, fromColumnForm);
		if (form.failure) return form.failure;
		const number = Number(params.sheet);
		return savedOrStale(
			await attempt(() => assignFromColumn(workshop(), member, number, form.data)),
		);
	},
	fromScratch: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, fromScratchForm);
		if (form.failure) return form.failure;
		const number = Number(params.sheet);
		return savedOrStale(
			await attempt(() => assignFromScratch(workshop(), member, number, form.data)),
		);
	},
} satisfies Actions;
