import { answerFields } from '$lib/schemas/recut-forms';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { answerIntake } from '$lib/server/services/intake-answer.service';
import { cancelIntake, intakeStatus, retryIntake } from '$lib/server/services/intake.service';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return { intake: await forPage(() => intakeStatus(workshop(), member, params.intake)) };
}) satisfies PageServerLoad;

export const actions = {
	/** Answers what the file does not say. */
	answer: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.upload');
		const form = await readForm(request, answerFields);
		if (form.failure) return form.failure;
		const { data } = form;
		return (await attempt(() => answerIntake(workshop(), member, params.intake, data), data))
			.failure;
	},
	cancel: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		return (await attempt(() => cancelIntake(workshop(), member, params.intake))).failure;
	},
	retry: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		return (await attempt(() => retryIntake(workshop(), member, params.intake))).failure;
	},
} satisfies Actions;
