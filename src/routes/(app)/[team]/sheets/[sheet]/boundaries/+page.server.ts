import { z } from 'zod';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { acceptFinding } from '$lib/server/services/sheet.service';
import type { Actions } from './$types';

const whichFinding = z.object({ finding: z.coerce.number().int().positive() });

export const actions = {
	accept: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'findings.accept');
		const form = await readForm(request, whichFinding);
		if (form.failure) return form.failure;
		const { finding } = form.data;
		const number = Number(params.sheet);
		return (await attempt(() => acceptFinding(workshop(), member, number, finding))).failure;
	},
} satisfies Actions;
