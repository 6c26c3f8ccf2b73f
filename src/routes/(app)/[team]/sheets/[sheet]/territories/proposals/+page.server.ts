import { error } from '@sveltejs/kit';
import {
	adoptForm,
	beginForm,
	comparedNumbers,
	proposalForm,
	renameForm,
} from '$lib/schemas/territory-forms';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { adoptProposal } from '$lib/server/services/proposal-adopt.service';
import {
	cancelProposal,
	dropProposal,
	duplicateProposal,
	renameProposal,
} from '$lib/server/services/proposal-keep.service';
import { beginProposal, openProposal } from '$lib/server/services/proposals.service';
import type { Actions, PageServerLoad } from './$types';

/** The proposals named by `?with=1&with=3`, as `compared`. */
export const load = (async ({ locals, params, url, depends }) => {
	const member = memberFor(locals, 'measures.read');
	depends('merestone:territories');
	const number = Number(params.sheet);
	const wanted = comparedNumbers.safeParse(url.searchParams.getAll('with'));
	if (!wanted.success) error(400, 'Compare at most six proposals, by their numbers.');
	return {
		compared: await forPage(() =>
			Promise.all(wanted.data.map((one) => openProposal(workshop(), member, number, one))),
		),
	};
}) satisfies PageServerLoad;

/**
 * Fields of each form: see `schemas/territory-forms.ts`. All answer `FormProblem` on failure; `begin`,
 * `duplicate` answer `{ proposal }`, the number made; `adopt` the `revision` that was saved.
 */
export const actions = {
	begin: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, beginForm);
		if (form.failure) return form.failure;
		const number = Number(params.sheet);
		const { name } = form.data;
		const begun = await attempt(() => beginProposal(workshop(), member, number, form.data), {
			name,
		});
		return begun.failure ?? { proposal: begun.data.number };
	},
	cancel: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, proposalForm);
		if (form.failure) return form.failure;
		const { proposal } = form.data;
		const number = Number(params.sheet);
		return (await attempt(() => cancelProposal(workshop(), member, number, proposal))).failure;
	},
	drop: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, proposalForm);
		if (form.failure) return form.failure;
		const { proposal } = form.data;
		const number = Number(params.sheet);
		return (await attempt(() => dropProposal(workshop(), member, number, proposal))).failure;
	},
	rename: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, renameForm);
		if (form.failure) return form.failure;
		const { proposal, name } = form.data;
		const number = Number(params.sheet);
		const rename = () => renameProposal(workshop(), member, number, proposal, name);
		return (await attempt(rename, { name })).failure;
	},
	duplicate: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, proposalForm);
		if (form.failure) return form.failure;
		const { proposal } = form.data;
		const number = Number(params.sheet);
		const made = await attempt(() => duplicateProposal(workshop(), member, number, proposal));
		return made.failure ?? { proposal: made.data.number };
	},
	adopt: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, adoptForm);
		if (form.failure) return form.failure;
		const { proposal, revision, outside } = form.data;
		const adoption = { revision, outside: outside === 'yes' };
		const number = Number(params.sheet);
		const adopt = () => adoptProposal(workshop(), member, number, proposal, adoption);
		const adopted = await attempt(adopt);
		return adopted.failure ?? { revision: adopted.data.revision };
	},
} satisfies Actions;
