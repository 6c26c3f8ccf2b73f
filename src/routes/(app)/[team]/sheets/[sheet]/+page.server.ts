import { redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { nameSheet, removeSheet } from '$lib/server/services/sheet.service';
import type { Actions, PageServerLoad } from './$types';

/** A sheet opens at its colours; its address alone is what people pass on. */
export const load = (({ locals, params }) => {
	memberFor(locals, 'sheet.read');
	redirect(303, coloursOf(params));
}) satisfies PageServerLoad;

const coloursOf = ({ team, sheet }: { team: string; sheet: string }) =>
	`/${team}/sheets/${sheet}/colours`;

const newName = z.object({ name: z.string().trim().min(1, 'Give the sheet a name.').max(200) });

export const actions = {
	rename: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const form = await readForm(request, newName);
		if (form.failure) return form.failure;
		const { name } = form.data;
		const number = Number(params.sheet);
		const named = await attempt(() => nameSheet(workshop(), member, number, name));
		if (named.failure) return named.failure;
		redirect(303, coloursOf(params));
	},
	delete: async ({ locals, params }) => {
		const member = memberFor(locals, 'sheet.delete');
		const gone = await attempt(() => removeSheet(workshop(), member, Number(params.sheet)));
		if (gone.failure) return gone.failure;
		redirect(303, `/${params.team}/sheets`);
	},
} satisfies Actions;
