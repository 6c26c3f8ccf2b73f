import { fail } from '@sveltejs/kit';
import { layoutForm } from '$lib/schemas/layout-form';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { saveLayout } from '$lib/server/services/draft.service';
import type { Actions } from './$types';

export const actions = {
	/** For browsers without JavaScript; with it, the layout is saved with the rest of the draft. */
	save: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const read = layoutForm.safeParse(Object.fromEntries(await request.formData()));
		if (!read.success) {
			const [issue] = read.error.issues;
			return fail(400, { message: `${issue.path.join('.')}: ${issue.message}` });
		}
		const result = await forPage(() =>
			saveLayout(workshop(), member, Number(params.sheet), read.data),
		);
		if (result.status === 'stale') {
			return fail(409, {
				message: 'Somebody else saved meanwhile; nothing was changed. Try again.',
			});
		}
		return { message: '' };
	},
} satisfies Actions;
