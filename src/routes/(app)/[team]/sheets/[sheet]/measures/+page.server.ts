import { fail, redirect } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import { UploadFault } from '$lib/server/files/multipart';
import { attempt } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { mostTableBytes, uploadTable } from '$lib/server/services/measure-upload.service';
import { deskMeasures, measureTables } from '$lib/server/services/measures.service';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'measures.read');
	const number = Number(params.sheet);
	return forPage(async () => ({
		tables: await measureTables(workshop(), member, number),
		columns: await deskMeasures(workshop(), member, number),
		maxBytes: mostTableBytes,
	}));
}) satisfies PageServerLoad;

export const actions = {
	/** The form is read as it arrives: the file goes to the disk and is never held in memory. */
	upload: async ({ locals, request, params }) => {
		const member = memberFor(locals, 'measures.edit');
		const taken = await attempt(() => take(member, Number(params.sheet), request));
		if (taken.failure) return taken.failure;
		if ('fault' in taken.data) {
			const { status, message } = taken.data.fault;
			return fail(status, { message, errors: {}, values: {} });
		}
		redirect(303, `/${params.team}/sheets/${params.sheet}/measures/${taken.data.number}`);
	},
} satisfies Actions;

const take = (member: ReturnType<typeof memberFor>, sheet: number, request: Request) =>
	uploadTable(workshop(), member, sheet, request).catch((fault: unknown) => {
		if (fault instanceof UploadFault) return { fault };
		throw fault;
	});
