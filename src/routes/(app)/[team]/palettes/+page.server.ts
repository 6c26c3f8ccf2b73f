import { fail } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { approvePalette, endPaletteApproval } from '$lib/server/services/palette-approval.service';
import {
	addPalette,
	copyPalette,
	removePalette,
	teamPalettes,
} from '$lib/server/services/palette.service';
import { newPalette, paletteId, paletteToCopy } from '$lib/schemas/palette';
import { approvalForm } from '$lib/schemas/palette-form';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	return { palettes: await forPage(() => teamPalettes(workshop(), member)) };
}) satisfies PageServerLoad;

const unknown = 'There is no such palette here.';

export const actions = {
	add: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const typed = Object.fromEntries(await request.formData());
		const read = newPalette.safeParse(typed);
		const values = { name: textOf(typed.name), inks: textOf(typed.inks) };
		if (!read.success) return fail(400, { message: read.error.issues[0].message, ...values });
		const added = await attempt(() => addPalette(workshop(), member, read.data));
		if (!added.failure) return { said: `${read.data.name} is added.` };
		return fail(422, { message: messageOf(added.failure.data), ...values });
	},
	copy: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await readForm(request, paletteToCopy);
		if (form.failure) return fail(400, { refused: unknown });
		const { id } = form.data;
		const copied = await attempt(() => copyPalette(workshop(), member, id));
		if (copied.failure) return fail(422, { refused: messageOf(copied.failure.data) });
		return { said: 'The copy is among the team’s own.' };
	},
	approve: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.approve');
		const form = await readForm(request, approvalForm);
		if (form.failure) return fail(400, { refused: unknown });
		const { id, digest } = form.data;
		const approved = await attempt(() => approvePalette(workshop(), member, id, digest));
		if (approved.failure)
			return fail(approved.failure.status, { refused: messageOf(approved.failure.data) });
		return { said: 'The palette is approved as it stands.' };
	},
	unapprove: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.approve');
		const form = await readForm(request, paletteId);
		if (form.failure) return fail(400, { refused: unknown });
		const ended = await attempt(() => endPaletteApproval(workshop(), member, form.data.id));
		if (ended.failure) return fail(422, { refused: messageOf(ended.failure.data) });
		return { said: 'The approval is taken back.' };
	},
	remove: async ({ locals, request }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await readForm(request, paletteId);
		if (form.failure) return fail(400, { refused: unknown });
		await forPage(() => removePalette(workshop(), member, form.data.id));
		return { said: 'The palette is removed. Sheets that use it keep their copy.' };
	},
} satisfies Actions;

const textOf = (value: FormDataEntryValue | undefined) => (typeof value === 'string' ? value : '');

const messageOf = ({
	message,
	errors,
}: {
	message?: string;
	errors: Record<string, string[] | undefined>;
}) => message ?? Object.values(errors).flat()[0] ?? 'That could not be done.';
