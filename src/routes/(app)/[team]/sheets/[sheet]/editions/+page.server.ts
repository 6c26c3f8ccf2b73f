import { z } from 'zod';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { issueEdition } from '$lib/server/services/edition.service';
import type { Actions } from './$types';

const whatToIssue = z.object({
	revision: z.coerce.number().int().positive(),
	note: z.string().trim().max(2_000).default(''),
});

export const actions = {
	issue: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'edition.issue');
		const form = await readForm(request, whatToIssue);
		if (form.failure) return form.failure;
		const { revision, note } = form.data;
		const number = Number(params.sheet);
		const issued = await attempt(() => issueEdition(workshop(), member, number, revision, note), {
			note,
		});
		return issued.failure ?? { issued: issued.data.number };
	},
} satisfies Actions;
