import { fail } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { attempt } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { changePalette, readPalette } from '$lib/server/services/palette.service';
import { inkRows, revisionField, rowsOf, typedPalette } from '$lib/schemas/palette-form';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	const palette = await forPage(() => readPalette(workshop(), member, params.palette));
	return { palette, rows: rowsOf(palette.inks) };
}) satisfies PageServerLoad;

export const actions = {
	save: async ({ locals, request, params }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await request.formData();
		const rows = inkRows(form);
		const name = String(form.get('name') ?? '');
		const typed = typedPalette.safeParse({ name, rows });
		if (!typed.success) return fail(400, { name, rows, message: typed.error.issues[0].message });
		const revision = revisionField.safeParse(form.get('revision'));
		if (!revision.success)
			return fail(400, { name, rows, message: 'Load the page again: it is out of date.' });
		const change = { name: typed.data.name, inks: typed.data.rows, revision: revision.data };
		const { palette } = params;
		await forPage(() => readPalette(workshop(), member, palette));
		const changed = await attempt(() => changePalette(workshop(), member, palette, change));
		if (!changed.failure) return { said: 'The palette is saved.' };
		const { message, errors } = changed.failure.data;
		const said = message ?? Object.values(errors).flat()[0];
		return fail(changed.failure.status, { name, rows, message: said });
	},
} satisfies Actions;
