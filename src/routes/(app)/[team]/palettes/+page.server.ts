import { memberFor } from '$lib/server/access/guard';
import { mayDo } from '$lib/server/access/member';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { addPalette, removePalette, teamPalettes } from '$lib/server/services/palette.service';
import { newPalette, paletteId } from '$lib/schemas/palette';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	const palettes = await forPage(() => teamPalettes(workshop(), member));
	return { palettes, mayEdit: mayDo(member, 'palette.edit') };
}) satisfies PageServerLoad;

export const actions = {
	add: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await readForm(request, newPalette);
		if (form.failure) return form.failure;
		return (await attempt(() => addPalette(workshop(), member, form.data))).failure;
	},
	delete: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await readForm(request, paletteId);
		if (form.failure) return form.failure;
		return (await attempt(() => removePalette(workshop(), member, form.data.id))).failure;
	},
} satisfies Actions;
