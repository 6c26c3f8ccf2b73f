import { z } from 'zod';
import { memberFor } from '$lib/server/access/guard';
import { readActivity } from '$lib/server/services/activity.service';
import { readMembers } from '$lib/server/services/members.service';
import type { PageServerLoad } from './$types';

/** What the address asks for; what makes no sense there is left out rather than refused. */
const query = z.object({
	kind: z
		.string()
		.regex(/^[a-z-]{1,40}$/)
		.nullable()
		.catch(null),
	by: z.uuid().nullable().catch(null),
	page: z.coerce.number().int().min(1).max(1_000_000).catch(1),
});

export const load = (async ({ locals, url }) => {
	const member = memberFor(locals, 'activity.read');
	const wanted = query.parse({
		kind: url.searchParams.get('kind') || null,
		by: url.searchParams.get('by') || null,
		page: url.searchParams.get('page') ?? 1,
	});
	const filter = { kind: wanted.kind, userId: wanted.by };
	const [activity, members] = await Promise.all([
		readActivity(member, filter, wanted.page),
		readMembers(member),
	]);
	const people = members.map(({ id, name, email }) => ({ value: id, label: name ?? email }));
	return { ...activity, people, wanted };
}) satisfies PageServerLoad;
