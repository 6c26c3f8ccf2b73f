import { memberFor } from '$lib/server/access/guard';
import { attempt } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { cancelIntake, intakeStatus, retryIntake } from '$lib/server/services/intake.service';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return { intake: await forPage(() => intakeStatus(workshop(), member, params.intake)) };
}) satisfies PageServerLoad;

export const actions = {
	cancel: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		return (await attempt(() => cancelIntake(workshop(), member, params.intake))).failure;
	},
	retry: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		return (await attempt(() => retryIntake(workshop(), member, params.intake))).failure;
	},
} satisfies Actions;
