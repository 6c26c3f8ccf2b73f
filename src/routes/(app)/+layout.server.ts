import { userFor } from '$lib/server/access/guard';
import type { LayoutServerLoad } from './$types';

export const load = (({ locals }) => {
	const { name, email } = userFor(locals);
	return { user: { name, email } };
}) satisfies LayoutServerLoad;
