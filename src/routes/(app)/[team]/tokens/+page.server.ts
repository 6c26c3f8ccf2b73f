import type { Actions } from '@sveltejs/kit';
import { z } from 'zod';
import { manyOf, rowId } from '$lib/schemas/people';
import { memberFor } from '$lib/server/access/guard';
import { scopes, scopeWords } from '$lib/server/access/scopes';
import { attempt, readForm } from '$lib/server/forms';
import { createToken, readTokens, withdrawToken } from '$lib/server/services/tokens.service';
import type { PageServerLoad } from './$types';

export const load = (async ({ locals }) => ({
	tokens: await readTokens(memberFor(locals, 'tokens.manage')),
	now: new Date(),
	scopeWords,
})) satisfies PageServerLoad;

const tokenForm = z.object({
	name: z.string().trim().min(1, 'Say what the token is for.').max(120),
	scopes: manyOf(z.enum(scopes), 'Choose at least one thing that the token may do.'),
	days: z.coerce.number().pipe(z.union([z.literal(30), z.literal(90), z.literal(365)])),
});

export const actions = {
	make: async ({ request, locals, setHeaders }) => {
		const member = memberFor(locals, 'tokens.manage');
		const { data, failure } = await readForm(request, tokenForm);
		if (failure) return failure;
		const made = await attempt(() => createToken(member, data), { name: data.name });
		if (made.failure) return made.failure;
		setHeaders({ 'cache-control': 'no-store' });
		return { made: made.data };
	},
	withdraw: async ({ request, locals }) => {
		const member = memberFor(locals, 'tokens.manage');
		const { data, failure } = await readForm(request, z.object({ id: rowId }));
		if (failure) return failure;
		const withdrawn = await attempt(() => withdrawToken(member, data.id));
		return (
			withdrawn.failure ?? { done: 'The token is withdrawn; calls with it are refused from now.' }
		);
	},
} satisfies Actions;
