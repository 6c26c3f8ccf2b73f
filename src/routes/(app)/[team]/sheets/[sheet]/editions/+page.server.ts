import { z } from 'zod';
import { askExportForm, exportNumberForm } from '$lib/schemas/export';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { themedEditions } from '$lib/server/services/edition-changes.service';
import { issueEdition } from '$lib/server/services/edition.service';
import { stopExport } from '$lib/server/services/export-end.service';
import { askForExport, deskExports } from '$lib/server/services/exports.service';
import type { Actions, PageServerLoad } from './$types';

const whatToIssue = z.object({
	revision: z.coerce.number().int().positive(),
	note: z.string().trim().max(2_000).default(''),
});

/** The files that were taken of editions and drafts, and the editions that show a measure. */
export const load = (async ({ locals, params, depends }) => {
	const member = memberFor(locals, 'files.download');
	depends('merestone:exports');
	return {
		exports: await forPage(() => deskExports(workshop(), member, Number(params.sheet))),
		themed: await forPage(() => themedEditions(workshop(), member, Number(params.sheet))),
	};
}) satisfies PageServerLoad;

/** All answer `FormProblem` on failure. */
export const actions = {
	issue: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'edition.issue');
		const form = await readForm(request, whatToIssue);
		if (form.failure) return form.failure;
		const { revision, note } = form.data;
		const number = Number(params.sheet);
		const issued = await attempt(() => issueEdition(workshop(), member, number, revision, note), {
			note,
		});
		return issued.failure ?? { issued: issued.data.number };
	},
	take: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'files.download');
		const form = await readForm(request, askExportForm);
		if (form.failure) return form.failure;
		const { asked, revision } = form.data;
		const ask = () => askForExport(workshop(), member, Number(params.sheet), asked, revision);
		const taken = await attempt(ask);
		return taken.failure ?? { taken: taken.data.number };
	},
	stop: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'files.download');
		const form = await readForm(request, exportNumberForm);
		if (form.failure) return form.failure;
		const stop = () => stopExport(workshop(), member, Number(params.sheet), form.data.export);
		return (await attempt(stop)).failure;
	},
} satisfies Actions;
