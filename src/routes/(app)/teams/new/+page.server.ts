import { redirect, type Actions } from '@sveltejs/kit';
import { z } from 'zod';
import { teamName } from '$lib/schemas/people';
import { userFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { createTeam } from '$lib/server/services/teams.service';

export const actions = {
	default: async ({ request, locals }) => {
		const user = userFor(locals);
		const { data, failure } = await readForm(request, z.object({ name: teamName }));
		if (failure) return failure;
		const made = await attempt(() => createTeam(user.id, data.name), data);
		if (made.failure) return made.failure;
		redirect(303, `/${made.data.slug}`);
	},
} satisfies Actions;
