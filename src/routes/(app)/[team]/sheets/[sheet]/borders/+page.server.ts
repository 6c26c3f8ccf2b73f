import { z } from 'zod';
import { mostWaterKm } from '$lib/schemas/draft';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { measureSheetGaps } from '$lib/server/services/gaps.service';
import type { Actions } from './$types';

const say = `Give a distance above 0 and up to ${mostWaterKm} km.`;
const howFar = z.object({ km: z.coerce.number(say).positive(say).max(mostWaterKm, say) });

export const actions = {
	/** Measures gaps across water in a thread; the form is answered once they are kept. */
	gaps: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'borders.edit');
		const form = await readForm(request, howFar);
		if (form.failure) return form.failure;
		const { km } = form.data;
		const number = Number(params.sheet);
		const done = await attempt(
			() => measureSheetGaps(workshop(), member, number, km, request.signal),
			{ km: String(km) },
		);
		return done.failure ?? { gaps: done.data };
	},
} satisfies Actions;
