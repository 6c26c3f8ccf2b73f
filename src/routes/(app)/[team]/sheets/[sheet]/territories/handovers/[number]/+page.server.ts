import { randomUUID } from 'node:crypto';
import type { Actions, RequestEvent } from '@sveltejs/kit';
import { z } from 'zod';
import { approveForm, reasonForm, sendForm, stateForm } from '$lib/schemas/handover';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { readHandover } from '$lib/server/services/handover.service';
import { endLetter, sendLetters } from '$lib/server/services/handover-letters.service';
import {
	approveHandover,
	changeMoveState,
	changeReason,
	confirmHandover,
	withdrawHandover,
} from '$lib/server/services/handover-work.service';
import { askedOf, movesAsked } from './move-rows';
import { sentInWords } from './letter-words';
import type { PageServerLoad } from './$types';

type Where = Pick<RequestEvent, 'params'>;
const place = ({ params }: Where) => [Number(params.sheet), Number(params.number)] as const;

export const load = (async ({ locals, params, url }) => {
	const member = memberFor(locals, 'measures.read');
	const list = await forPage(() => readHandover(workshop(), member, ...place({ params })));
	const asked = askedOf(url.searchParams);
	const chosen = Number(url.searchParams.get('move'));
	const { moves, ...head } = list;
	return {
		list: head,
		total: moves.length,
		shown: movesAsked(list, asked),
		asked,
		chosen: moves.find(({ ordinal }) => ordinal === chosen) ?? null,
		adrift: moves.filter(({ contradicted }) => contradicted).length,
		/** pressing twice sends once */
		press: randomUUID(),
	};
}) satisfies PageServerLoad;

export const actions = {
	reason: async (event) => {
		const member = memberFor(event.locals, 'handover.edit');
		const { data, failure } = await readForm(event.request, reasonForm);
		if (failure) return failure;
		const done = await attempt(() => changeReason(workshop(), member, ...place(event), data), {
			reason: data.reason,
		});
		return done.failure ?? { done: 'The reason is changed.' };
	},
	state: async (event) => {
		const member = memberFor(event.locals, 'handover.edit');
		const { data, failure } = await readForm(event.request, stateForm);
		if (failure) return failure;
		const done = await attempt(() => changeMoveState(workshop(), member, ...place(event), data), {
			state: data.state,
			word: data.word,
		});
		return done.failure ?? { done: `The move is ${data.state} now.` };
	},
	send: async (event) => {
		const member = memberFor(event.locals, 'handover.edit');
		const { data, failure } = await readForm(event.request, sendForm);
		if (failure) return failure;
		const sent = await attempt(() => sendLetters(workshop(), member, ...place(event), data));
		return sent.failure ?? { done: sentInWords(sent.data), failed: sent.data.failed > 0 };
	},
	end: async (event) => {
		const member = memberFor(event.locals, 'handover.edit');
		const form = z.object({ territory: z.string().min(1).max(80) });
		const { data, failure } = await readForm(event.request, form);
		if (failure) return failure;
		const ended = await attempt(() =>
			endLetter(workshop(), member, ...place(event), data.territory),
		);
		return ended.failure ?? { done: 'The link of this letter no longer works.' };
	},
	confirm: async (event) => {
		const member = memberFor(event.locals, 'handover.edit');
		const done = await attempt(() => confirmHandover(workshop(), member, ...place(event)));
		return done.failure ?? { done: 'The list is confirmed as it stands.' };
	},
	withdraw: async (event) => {
		const member = memberFor(event.locals, 'handover.edit');
		const done = await attempt(() => withdrawHandover(workshop(), member, ...place(event)));
		return (
			done.failure ?? { done: 'The list is withdrawn. No link of its letters works any more.' }
		);
	},
	approve: async (event) => {
		const member = memberFor(event.locals, 'handover.approve');
		const { data, failure } = await readForm(event.request, approveForm);
		if (failure) return failure;
		const done = await attempt(() =>
			approveHandover(workshop(), member, ...place(event), data.seen),
		);
		return done.failure ?? { done: 'The list is approved. It will not change again.' };
	},
} satisfies Actions;
