import { fail, redirect } from '@sveltejs/kit';
import { readDesignTokens, tokenLimits } from '$lib/engines/palettes/tokens';
import { memberFor } from '$lib/server/access/guard';
import { attempt } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { addPalette } from '$lib/server/services/palette.service';
import { inkRows, rowsOf, typedPalette } from '$lib/schemas/palette-form';
import type { Actions, PageServerLoad } from './$types';

export const load = (({ locals }) => {
	memberFor(locals, 'palette.edit');
}) satisfies PageServerLoad;

const refusal = (status: number, refused: string, within: string, groups: string[] = []) =>
	fail(status, { refused, groups, within });

export const actions = {
	/** Reads a Design Tokens file into the form; nothing is kept yet. */
	read: async ({ locals, request }) => {
		memberFor(locals, 'palette.edit');
		const form = await request.formData();
		const file = form.get('file');
		const within = String(form.get('within') ?? '')
			.trim()
			.slice(0, 1_000);
		if (!(file instanceof File) || file.size === 0)
			return refusal(400, 'Choose a Design Tokens file first.', within);
		if (file.size > 4 * tokenLimits.characters)
			return refusal(413, 'The file is too large to be a Design Tokens file.', within);
		const read = readDesignTokens(await file.text(), within);
		if (read.status === 'refused') return refusal(422, read.message, within, read.groups);
		const name = file.name.replace(/(\.tokens)?(\.json)?$/i, '').slice(0, 120) || 'From a file';
		return { name, rows: rowsOf(read.inks), notes: read.notes, file: file.name };
	},
	save: async ({ locals, request, params }) => {
		const member = memberFor(locals, 'palette.edit');
		const form = await request.formData();
		const rows = inkRows(form);
		const name = String(form.get('name') ?? '');
		const typed = typedPalette.safeParse({ name, rows });
		if (!typed.success) return fail(400, { name, rows, message: typed.error.issues[0].message });
		const { data } = typed;
		const added = await attempt(() =>
			addPalette(workshop(), member, { name: data.name, inks: data.rows }),
		);
		if (added.failure) {
			const { message, errors } = added.failure.data;
			return fail(422, { name, rows, message: message ?? Object.values(errors).flat()[0] });
		}
		redirect(303, `/${params.team}/palettes`);
	},
} satisfies Actions;
