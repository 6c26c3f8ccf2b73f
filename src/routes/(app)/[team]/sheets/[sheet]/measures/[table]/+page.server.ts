import { redirect } from '@sveltejs/kit';
import {
	columnsForm,
	decisionsForm,
	joinForm,
	measureForm,
	sweepForm,
	tableReading,
	takeForm,
} from '$lib/schemas/measure-forms';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import {
	chooseColumns,
	chooseJoin,
	decideRows,
	readTableReview,
	sweepRows,
} from '$lib/server/services/measure-review.service';
import { takeTable } from '$lib/server/services/measure-taking.service';
import {
	dropMeasure,
	dropTable,
	joinAgain,
	rereadTable,
} from '$lib/server/services/measure-upkeep.service';
import type { Actions, PageServerLoad } from './$types';

export const load = (async ({ locals, params, url }) => {
	const member = memberFor(locals, 'measures.read');
	const page = Number(url.searchParams.get('page') ?? 1) || 1;
	const find = (url.searchParams.get('find') ?? '').slice(0, 200);
	return forPage(() =>
		readTableReview(workshop(), member, ...tableIn(params), {
			...{ page, find },
		}),
	);
}) satisfies PageServerLoad;

const tableIn = ({ sheet, table }: { sheet: string; table: string }) =>
	[Number(sheet), Number(table)] as const;
const stage = ({ team, sheet }: { team: string; sheet: string }) =>
	`/${team}/sheets/${sheet}/measures`;

export const actions = {
	read: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'measures.edit');
		const form = await readForm(request, tableReading);
		if (form.failure) return form.failure;
		const done = await attempt(() =>
			rereadTable(workshop(), member, ...tableIn(params), form.data),
		);
		return done.failure ?? { done: 'read' };
	},
	join: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'measures.edit');
		const form = await readForm(request, joinForm);
		if (form.failure) return form.failure;
		const done = await attempt(() => chooseJoin(workshop(), member, ...tableIn(params), form.data));
		return done.failure ?? { done: 'join' };
	},
	decide: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'measures.edit');
		const form = await readForm(request, decisionsForm);
		if (form.failure) return form.failure;
		const typed = Object.fromEntries(
			form.data.map(({ row, region }) => [`other-${row}`, region ?? '']),
		);
		const done = await attempt(
			() => decideRows(workshop(), member, ...tableIn(params), form.data),
			typed,
		);
		return done.failure ?? { done: 'decide', rows: form.data.length };
	},
	sweep: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'measures.edit');
		const form = await readForm(request, sweepForm);
		if (form.failure) return form.failure;
		const done = await attempt(() => sweepRows(workshop(), member, ...tableIn(params), form.data));
		return done.failure ?? { done: 'sweep' };
	},
	columns: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'measures.edit');
		const form = await readForm(request, columnsForm);
		if (form.failure) return form.failure;
		const done = await attempt(() =>
			chooseColumns(workshop(), member, ...tableIn(params), form.data),
		);
		return done.failure ?? { done: 'columns' };
	},
	take: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'measures.edit');
		const form = await readForm(request, takeForm);
		if (form.failure) return form.failure;
		const confidential = form.data.confidential !== undefined;
		const taken = await attempt(() =>
			takeTable(workshop(), member, ...tableIn(params), confidential),
		);
		if (taken.failure) return taken.failure;
		redirect(303, stage(params));
	},
	again: async ({ locals, params }) => {
		const member = memberFor(locals, 'measures.edit');
		const again = await attempt(() => joinAgain(workshop(), member, ...tableIn(params)));
		if (again.failure) return again.failure;
		redirect(303, `${stage(params)}/${again.data}`);
	},
	drop: async ({ locals, params }) => {
		const member = memberFor(locals, 'measures.edit');
		const gone = await attempt(() => dropTable(workshop(), member, ...tableIn(params)));
		if (gone.failure) return gone.failure;
		redirect(303, stage(params));
	},
	dropMeasure: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'measures.edit');
		const form = await readForm(request, measureForm);
		if (form.failure) return form.failure;
		const { measure } = form.data;
		const gone = await attempt(() => dropMeasure(workshop(), member, ...tableIn(params), measure));
		return gone.failure ?? { done: 'dropMeasure' };
	},
} satisfies Actions;
