import { fail } from '@sveltejs/kit';
import { layoutForm } from '$lib/schemas/layout-form';
import {
	newTemplate,
	templateAlike,
	templateId,
	templateRename,
	templateReplace,
	templateUse,
} from '$lib/schemas/template';
import { memberFor } from '$lib/server/access/guard';
import { attempt, readForm } from '$lib/server/forms';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { saveLayout } from '$lib/server/services/draft.service';
import { setAlike } from '$lib/server/services/series.service';
import {
	applyTemplate,
	keepTemplate,
	readTemplates,
	removeTemplate,
	renameTemplate,
	replaceTemplate,
} from '$lib/server/services/templates.service';
import { answered, staleNews } from './template-answers';
import type { Actions, PageServerLoad } from './$types';

/** The team's templates, with the sheets that were set by them. */
export const load = (async ({ locals }) => {
	const member = memberFor(locals, 'sheet.read');
	return { templates: await forPage(() => readTemplates(workshop(), member)) };
}) satisfies PageServerLoad;

export const actions = {
	/** For browsers without JavaScript; with it, the layout is saved with the rest of the draft. */
	save: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const read = layoutForm.safeParse(Object.fromEntries(await request.formData()));
		if (!read.success) {
			const [issue] = read.error.issues;
			return fail(400, { message: `${issue.path.join('.')}: ${issue.message}` });
		}
		const result = await forPage(() =>
			saveLayout(workshop(), member, Number(params.sheet), read.data),
		);
		if (result.status === 'stale') {
			return fail(409, { message: staleNews });
		}
		return { message: '' };
	},
	keepTemplate: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const form = await readForm(request, newTemplate);
		if (form.failure) return form.failure;
		const keep = () => keepTemplate(workshop(), member, Number(params.sheet), form.data);
		const kept = await attempt(keep, { name: form.data.name });
		return kept.failure ?? { kept: { id: kept.data, name: form.data.name } };
	},
	replaceTemplate: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const form = await readForm(request, templateReplace);
		if (form.failure) return form.failure;
		const replace = () => replaceTemplate(workshop(), member, Number(params.sheet), form.data);
		return answered(await attempt(replace), 'The template says now what this sheet is set to.');
	},
	renameTemplate: async ({ locals, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const form = await readForm(request, templateRename);
		if (form.failure) return form.failure;
		const rename = () => renameTemplate(workshop(), member, form.data);
		return answered(await attempt(rename), 'The template has its new name.');
	},
	removeTemplate: async ({ locals, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const form = await readForm(request, templateId);
		if (form.failure) return form.failure;
		const remove = () => removeTemplate(workshop(), member, form.data.id);
		return answered(await attempt(remove), 'The template is removed; sheets stay as they are.');
	},
	/** For browsers without JavaScript; with it, the desk sets its own draft, so that it can be undone. */
	applyTemplate: async ({ locals, params, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const form = await readForm(request, templateUse);
		if (form.failure) return form.failure;
		const apply = () => applyTemplate(workshop(), member, Number(params.sheet), form.data);
		const applied = await attempt(apply);
		if (applied.failure) return applied.failure;
		return applied.data.status === 'stale'
			? fail(409, { message: staleNews })
			: { said: 'The sheet is set by the template.' };
	},
	alike: async ({ locals, request }) => {
		const member = memberFor(locals, 'layout.edit');
		const form = await readForm(request, templateAlike);
		if (form.failure) return form.failure;
		const set = await attempt(() => setAlike(workshop(), member, form.data));
		return set.failure ?? { alike: set.data };
	},
} satisfies Actions;
