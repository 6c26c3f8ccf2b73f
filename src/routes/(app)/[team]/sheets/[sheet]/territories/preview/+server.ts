import { error, json } from '@sveltejs/kit';
import { columnSource } from '$lib/schemas/territory-forms';
import { memberFor } from '$lib/server/access/guard';
import { workshop } from '$lib/server/jobs/workshop';
import { forPage } from '$lib/server/page';
import { previewFromColumn } from '$lib/server/services/territories-start.service';
import type { RequestHandler } from './$types';

/** `?source=attribute:province`: the territories that a column would give, as `TerritoriesPreview`. */
export const GET = (async ({ locals, params, url }) => {
	const member = memberFor(locals, 'territories.edit');
	const source = columnSource.safeParse(url.searchParams.get('source'));
	if (!source.success) error(400, 'Choose a column.');
	const number = Number(params.sheet);
	const preview = () => previewFromColumn(workshop(), member, number, source.data);
	return json(await forPage(preview));
}) satisfies RequestHandler;
