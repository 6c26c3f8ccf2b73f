import { redirect } from '@sveltejs/kit';
import { memberFor } from '$lib/server/access/guard';
import type { PageServerLoad } from './$types';

/** A team opens with its sheets. */
export const load = (({ locals }) => {
	const { team } = memberFor(locals, 'team.read');
	redirect(303, `/${team.slug}/sheets`);
}) satisfies PageServerLoad;
