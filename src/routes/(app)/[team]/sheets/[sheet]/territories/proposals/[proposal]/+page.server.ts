import { openedAdoptForm, openedNameForm } from '$lib/schemas/territory-forms';
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
import { recheckProposal } from '$lib/server/services/proposal-plan.service';
import { openProposal } from '$lib/server/services/proposals.service';
import type { Actions, PageServerLoad } from './$types';

const numbers = (params: { sheet: string; proposal: string }) =>
	[Number(params.sheet), Number(params.proposal)] as const;

/** `DeskProposal` as `proposal`. */
export const load = (async ({ locals, params, depends }) => {
	depends('merestone:territories');
	const member = memberFor(locals, 'measures.read');
	const [sheet, proposal] = numbers(params);
	return {
		proposal: await forPage(() => openProposal(workshop(), member, sheet, proposal)),
	};
}) satisfies PageServerLoad;

/** As on the list, for the proposal of the address: `name` to rename, `revision` and `outside` to adopt. */
export const actions = {
	cancel: async ({ locals, params }) => {
		const member = memberFor(locals, 'territories.edit');
		return (await attempt(() => cancelProposal(workshop(), member, ...numbers(params)))).failure;
	},
	drop: async ({ locals, params }) => {
		const member = memberFor(locals, 'territories.edit');
		return (await attempt(() => dropProposal(workshop(), member, ...numbers(params)))).failure;
	},
	rename: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, openedNameForm);
		if (form.failure) return form.failure;
		const { name } = form.data;
		const rename = () => renameProposal(workshop(), member, ...numbers(params), name);
		return (await attempt(rename, { name })).failure;
	},
	duplicate: async ({ locals, params }) => {
		const member = memberFor(locals, 'territories.edit');
		const made = await attempt(() => duplicateProposal(workshop(), member, ...numbers(params)));
		return made.failure ?? { proposal: made.data.number };
	},
	recheck: async ({ locals, params }) => {
		const member = memberFor(locals, 'territories.edit');
		return (await attempt(() => recheckProposal(workshop(), member, ...numbers(params)))).failure;
	},
	adopt: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'territories.edit');
		const form = await readForm(request, openedAdoptForm);
		if (form.failure) return form.failure;
		const adoption = { revision: form.data.revision, outside: form.data.outside === 'yes' };
		const adopt = () => adoptProposal(workshop(), member, ...numbers(params), adoption);
		const adopted = await attempt(adopt);
		return adopted.failure ?? { revision: adopted.data.revision };
	},
} satisfies Actions;
