import { redirect } from '@sveltejs/kit';
import { z } from 'zod';
import { mendForm, rereadForm, unmendForm } from '$lib/schemas/recut-forms';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { maxUpload } from '$lib/server/services/intake.service';
import { addMends, beginReading, takeBackMend } from '$lib/server/services/recut-begin.service';
import { sheetRecuts } from '$lib/server/services/recuts.service';
import { acceptFinding } from '$lib/server/services/sheet.service';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	const recuts = await forPage(() => sheetRecuts(workshop(), member, Number(params.sheet)));
	return { recuts, maxBytes: maxUpload() };
}) satisfies PageServerLoad;

const whichFinding = z.object({ finding: z.coerce.number().int().positive() });

const pageOf = ({ team, sheet }: { team: string; sheet: string }, recut: number) =>
	`/${team}/sheets/${sheet}/boundaries/recuts/${recut}`;

export const actions = {
	accept: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'findings.accept');
		const form = await readForm(request, whichFinding);
		if (form.failure) return form.failure;
		const { finding } = form.data;
		const number = Number(params.sheet);
		return (await attempt(() => acceptFinding(workshop(), member, number, finding))).failure;
	},
	/** Has the same file read in another way. */
	reread: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.mend');
		const form = await readForm(request, rereadForm);
		if (form.failure) return form.failure;
		const { data } = form;
		const begun = await attempt(() => beginReading(workshop(), member, Number(params.sheet), data));
		if (begun.failure) return begun.failure;
		redirect(303, pageOf(params, begun.data.number));
	},
	/** Has the same file read with more mends. */
	mend: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.mend');
		const form = await readForm(request, mendForm);
		if (form.failure) return form.failure;
		const { mends } = form.data;
		const begun = await attempt(() => addMends(workshop(), member, Number(params.sheet), mends));
		if (begun.failure) return begun.failure;
		redirect(303, pageOf(params, begun.data.number));
	},
	/** Has the same file read without one of its mends. */
	unmend: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.mend');
		const form = await readForm(request, unmendForm);
		if (form.failure) return form.failure;
		const { mend } = form.data;
		const begun = await attempt(() => takeBackMend(workshop(), member, Number(params.sheet), mend));
		if (begun.failure) return begun.failure;
		redirect(303, pageOf(params, begun.data.number));
	},
} satisfies Actions;
