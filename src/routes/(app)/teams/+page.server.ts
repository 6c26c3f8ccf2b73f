import { userFor } from '$lib/server/access/guard';
import { teamsOf } from '$lib/server/services/teams.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ locals }) => ({
	teams: await teamsOf(userFor(locals).id),
})) satisfies PageServerLoad;
