import { error, json } from '@sveltejs/kit';
import { saveDraft as sentDraft } from '$lib/schemas/draft';
import { memberFor } from '$lib/server/access/guard';
import { jsonOf } from '$lib/server/api/read-json';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { saveDraft } from '$lib/server/services/draft.service';
import type { RequestHandler } from './$types';

/** Saves the draft: 200 `DraftSaved`, or 409 `DraftStale` when somebody else saved first. */
export const POST = (async ({ locals, params, request }) => {
	const member = memberFor(locals, 'sheet.read');
	const sent = sentDraft.safeParse(await jsonOf(request));
	if (!sent.success) {
		const [issue] = sent.error.issues;
		error(400, `The draft was not understood: ${issue.path.join('.')} ${issue.message}`);
	}
	const save = () => saveDraft(workshop(), member, Number(params.sheet), sent.data);
	const result = await forPage(save);
	return result.status === 'saved' ? json(result.saved) : json(result.stale, { status: 409 });
}) satisfies RequestHandler;
