import { memberFor } from '$lib/server/access/guard';
import { mayDo } from '$lib/server/access/member';
import { actions } from '$lib/server/access/roles';
import type { LayoutServerLoad } from './$types';

/** Where one is and what one may do there, for the bar and for what pages offer. */
export const load = (({ locals }) => {
	const member = memberFor(locals, 'team.read');
	return {
		team: { slug: member.team.slug, name: member.team.name },
		roles: member.roles,
		rights: actions.filter((action) => mayDo(member, action)),
	};
}) satisfies LayoutServerLoad;
