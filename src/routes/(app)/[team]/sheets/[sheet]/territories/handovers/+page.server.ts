import { redirect, type Actions } from '@sveltejs/kit';
import { createHandoverForm } from '$lib/schemas/handover';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { createHandover, handoverList } from '$lib/server/services/handover.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'measures.read');
	return forPage(() => handoverList(workshop(), member, Number(params.sheet)));
}) satisfies PageServerLoad;

export const actions = {
	create: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'handover.edit');
		const form = await readForm(request, createHandoverForm);
		if (form.failure) return form.failure;
		const { proposal, effectiveOn, note } = form.data;
		const number = Number(params.sheet);
		const made = await attempt(() => createHandover(workshop(), member, number, form.data), {
			...{ proposal: String(proposal), effectiveOn, note },
		});
		if (made.failure) return made.failure;
		redirect(303, `/${params.team}/sheets/${number}/territories/handovers/${made.data}`);
	},
} satisfies Actions;
