import { error, type Actions } from '@sveltejs/kit';
import { answersForm } from '$lib/schemas/handover';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { acceptRest, answerLetter, readLetter } from '$lib/server/services/handover-link.service';
import type { PageServerLoad } from './$types';

/** A letter's page: whoever has the link reads and answers their own moves, and sees nothing else. */
export const load = (async ({ params, getClientAddress, setHeaders }) => {
	// the address is a secret, so no other site hears it; `no-referrer` would leave forms without an origin
	setHeaders({ 'cache-control': 'no-store', 'referrer-policy': 'same-origin' });
	const letter = await forPage(() => readLetter(workshop(), params.token, getClientAddress()));
	if (!letter) {
		error(
			404,
			'This link is not known, has ended or is too old. Ask whoever sent it for a new one.',
		);
	}
	return { letter };
}) satisfies PageServerLoad;

const thanks = (answers: number): string =>
	answers === 0 ? 'Nothing new was answered.' : 'Your answers are kept. Thank you.';

export const actions = {
	answer: async ({ params, request, getClientAddress }) => {
		const { data, failure } = await readForm(request, answersForm);
		if (failure) return failure;
		const typed = Object.fromEntries(
			data.flatMap(({ ordinal, answer, word }) => [
				[`answer.${ordinal}`, answer],
				[`word.${ordinal}`, word],
			]),
		);
		const { token = '' } = params;
		const kept = await attempt(
			() => answerLetter(workshop(), token, getClientAddress(), data),
			typed,
		);
		return kept.failure ?? { done: thanks(kept.data) };
	},
	rest: async ({ params, getClientAddress }) => {
		const { token = '' } = params;
		const kept = await attempt(() => acceptRest(workshop(), token, getClientAddress()));
		return kept.failure ?? { done: thanks(kept.data) };
	},
} satisfies Actions;
