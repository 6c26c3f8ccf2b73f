import { fail } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import {
	addPalette,
	changePalette,
	readPalette,
	teamPalettes,
} from '$lib/server/services/palette.service';
import { keptPalette } from '$lib/schemas/palette-form';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	return { palettes: await forPage(() => teamPalettes(workshop(), member)) };
}) satisfies PageServerLoad;

export const actions = {
	/** Keeps the sheet's inks as a palette of the team's. */
	keep: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await readForm(request, keptPalette);
		if (form.failure) {
			const said = Object.values(form.failure.data.errors).flat()[0];
			return fail(400, { keepFault: said ?? 'That could not be kept.' });
		}
		const { inks, over, name, revision } = form.data;
		const shop = workshop();
		if (!over && !name) return fail(400, { keepFault: 'Give the palette a name.' });
		if (over && !revision)
			return fail(400, { keepFault: 'Load the page again: it is out of date.' });
		const kept = await attempt(async () => {
			if (!over) return { id: await addPalette(shop, member, { name: name ?? '', inks }), name };
			const before = await readPalette(shop, member, over);
			await changePalette(shop, member, over, {
				name: before.name,
				inks,
				revision: Number(revision),
			});
			return { id: over, name: before.name };
		});
		if (!kept.failure) return { kept: { id: kept.data.id, name: kept.data.name ?? '' } };
		const { message, errors } = kept.failure.data;
		return fail(422, { keepFault: message ?? Object.values(errors).flat()[0] });
	},
} satisfies Actions;
