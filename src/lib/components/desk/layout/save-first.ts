import type { SubmitFunction } from '@sveltejs/kit';
import type { Desk } from '$lib/state/desk.svelte';

/**
 * For forms that take the sheet as it was saved last: sends only once the draft is saved, and says why not
 * otherwise, so that nobody keeps another layout than the one they look at.
 * @param tell what is wrong; '' once the form is on its way
 */
export const saveFirst =
	(
		desk: { draft: Pick<Desk['draft'], 'saveNow' | 'dirty' | 'stale'> },
		tell: (why: string) => void,
	) =>
	async ({ cancel }: Pick<Parameters<SubmitFunction>[0], 'cancel'>): Promise<boolean> => {
		tell('');
		await desk.draft.saveNow();
		if (!desk.draft.dirty && !desk.draft.stale) return true;
		tell(
			'The last change of this sheet is not saved yet, so nothing was kept. Try again once it is.',
		);
		cancel();
		return false;
	};
