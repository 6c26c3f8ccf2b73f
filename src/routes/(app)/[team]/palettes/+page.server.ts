import { fail } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { addPalette, removePalette, teamPalettes } from '$lib/server/services/palette.service';
import { newPalette, paletteId } from '$lib/schemas/palette';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	return { palettes: await forPage(() => teamPalettes(workshop(), member)) };
}) satisfies PageServerLoad;

export const actions = {
	add: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const typed = Object.fromEntries(await request.formData());
		const read = newPalette.safeParse(typed);
		const values = { name: textOf(typed.name), inks: textOf(typed.inks) };
		if (!read.success) return fail(400, { message: read.error.issues[0].message, ...values });
		const added = await attempt(() => addPalette(workshop(), member, read.data));
		if (!added.failure) return;
		const { message, errors } = added.failure.data;
		return fail(422, { message: message ?? Object.values(errors).flat()[0], ...values });
	},
	remove: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await readForm(request, paletteId);
		if (form.failure) return fail(400, { message: 'There is no such palette here.' });
		await forPage(() => removePalette(workshop(), member, form.data.id));
	},
} satisfies Actions;

const textOf = (value: FormDataEntryValue | undefined) => (typeof value === 'string' ? value : '');
