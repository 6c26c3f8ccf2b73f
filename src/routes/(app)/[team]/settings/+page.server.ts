import type { Actions } from '@sveltejs/kit';
import { z } from 'zod';
import { teamName } from '$lib/schemas/people';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { changeTeamName } from '$lib/server/services/teams.service';
import type { PageServerLoad } from './$types';

export const load = (({ locals }) => {
	memberFor(locals, 'team.manage');
}) satisfies PageServerLoad;

export const actions = {
	rename: async ({ request, locals }) => {
		const member = memberFor(locals, 'team.manage');
		const { data, failure } = await readForm(request, z.object({ name: teamName }));
		if (failure) return failure;
		const renamed = await attempt(() => changeTeamName(member, data.name), data);
		return renamed.failure ?? { done: 'The team has its new name.' };
	},
} satisfies Actions;
