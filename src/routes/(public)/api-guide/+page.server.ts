import { scopeWords } from '$lib/server/access/scopes';
import { guideOf } from '$lib/server/api/guide';
import type { PageServerLoad } from './$types';

export const load = (({ url }) => ({
	origin: url.origin,
	routes: guideOf(),
	scopes: Object.entries(scopeWords).map(([scope, words]) => ({ scope, words })),
})) satisfies PageServerLoad;
