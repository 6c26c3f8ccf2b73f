import { fail, redirect } from '@sveltejs/kit';
import { forgetForm } from '$lib/schemas/recut-forms';
import { memberFor } from '$lib/server/access/guard';
import { UploadFault } from '$lib/server/files/multipart';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import {
	beginIntake,
	beginSampleIntake,
	listIntakes,
	maxUpload,
} from '$lib/server/services/intake.service';
import { forgetAnswer, rememberedAnswers } from '$lib/server/services/reading-answers.service';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	const intakes = await forPage(() => listIntakes(workshop(), member));
	const remembered = await forPage(() => rememberedAnswers(workshop(), member));
	return { intakes, remembered, maxBytes: maxUpload() };
}) satisfies PageServerLoad;

export const actions = {
	/** The form is read as it arrives: the file goes to the disk and is never held in memory. */
	upload: async ({ locals, request, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		const begun = await attempt(() => begin(member, request));
		if (begun.failure) return begun.failure;
		if ('fault' in begun.data) {
			const { status, message } = begun.data.fault;
			return fail(status, { message, errors: {}, values: {} });
		}
		redirect(303, `/${params.team}/intakes/${begun.data.id}`);
	},
	/** Forgets how the team answered for files that look alike. */
	forget: async ({ locals, request }) => {
		const member = memberFor(locals, 'boundaries.upload');
		const form = await readForm(request, forgetForm);
		if (form.failure) return form.failure;
		const { about, likeness } = form.data;
		return (await attempt(() => forgetAnswer(workshop(), member, about, likeness))).failure;
	},
	/** Asked for by the page of sheets as well. */
	sample: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		const begun = await attempt(() => beginSampleIntake(workshop(), member));
		if (begun.failure) return begun.failure;
		redirect(303, `/${params.team}/intakes/${begun.data.id}`);
	},
} satisfies Actions;

const begin = (member: ReturnType<typeof memberFor>, request: Request) =>
	beginIntake(workshop(), member, request).catch((fault: unknown) => {
		if (fault instanceof UploadFault) return { fault };
		throw fault;
	});
