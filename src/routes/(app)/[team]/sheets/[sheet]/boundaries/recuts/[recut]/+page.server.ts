import { redirect } from '@sveltejs/kit';
import { answerFields, applyForm, decideForm, putBackForm } from '$lib/schemas/recut-forms';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { applyRecut } from '$lib/server/services/recut-apply.service';
import { decideRecut } from '$lib/server/services/recut-decide.service';
import { putBackRecut } from '$lib/server/services/recut-put-back.service';
import {
	answerRecut,
	cancelRecut,
	dropRecut,
	retryRecut,
} from '$lib/server/services/recut-work.service';
import { readRecutPage } from '$lib/server/services/recuts.service';
import type { Actions, PageServerLoad } from './$types';

type Params = { sheet: string; recut: string };
const numbers = ({ sheet, recut }: Params) => [Number(sheet), Number(recut)] as const;

export const load = (async ({ locals, params }) => {
	const member = memberFor(locals, 'sheet.read');
	return forPage(() => readRecutPage(workshop(), member, ...numbers(params)));
}) satisfies PageServerLoad;

export const actions = {
	/** Answers what the file does not say. */
	answer: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.upload');
		const form = await readForm(request, answerFields);
		if (form.failure) return form.failure;
		const { data } = form;
		const work = () => answerRecut(workshop(), member, ...numbers(params), data);
		return (await attempt(work, data)).failure;
	},
	/** Corrects which regions go on as which. */
	decide: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.mend');
		const form = await readForm(request, decideForm);
		if (form.failure) return form.failure;
		const { decisions } = form.data;
		const work = () => decideRecut(workshop(), member, ...numbers(params), decisions);
		return (await attempt(work)).failure;
	},
	apply: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.mend');
		const form = await readForm(request, applyForm);
		if (form.failure) return form.failure;
		const { revision } = form.data;
		const work = () => applyRecut(workshop(), member, ...numbers(params), revision);
		return (await attempt(work)).failure;
	},
	putBack: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'boundaries.mend');
		const form = await readForm(request, putBackForm);
		if (form.failure) return form.failure;
		const sure = form.data.sure === 'yes';
		const work = () => putBackRecut(workshop(), member, ...numbers(params), sure);
		return (await attempt(work)).failure;
	},
	drop: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		const gone = await attempt(() => dropRecut(workshop(), member, ...numbers(params)));
		if (gone.failure) return gone.failure;
		redirect(303, `/${params.team}/sheets/${params.sheet}/boundaries`);
	},
	cancel: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		return (await attempt(() => cancelRecut(workshop(), member, ...numbers(params)))).failure;
	},
	/** Has it read once more, against the boundaries that the sheet has now. */
	retry: async ({ locals, params }) => {
		const member = memberFor(locals, 'boundaries.upload');
		return (await attempt(() => retryRecut(workshop(), member, ...numbers(params)))).failure;
	},
} satisfies Actions;
