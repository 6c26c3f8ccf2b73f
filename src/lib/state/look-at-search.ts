import type { SearchFound, SearchNote } from '$lib/schemas/search';
import type { Desk } from './desk.svelte';

/** Whether a longer try found a colouring for rules that have changed since. */
export const canBeLookedAt = ({ state, gain }: SearchNote): boolean =>
	state === 'kept' && (gain === 'fewer-inks' || gain === 'answer');

/** Lays the inks that a longer try found on the sheet for a while; answers what went wrong, or ''. */
export async function lookAtSearch(
	desk: Desk,
	{ number, revision, sentence }: SearchNote,
	fetcher: typeof fetch = (...asked) => fetch(...asked),
): Promise<string> {
	const response = await fetcher(`${desk.address}/searches/${number}`).catch(() => null);
	if (!response?.ok) return 'It could not be read. Try again.';
	const { inks }: SearchFound = await response.json();
	if (!inks) return 'It found no colouring.';
	if (inks.length !== desk.sheet.regions.key.length) return 'It is about other boundaries.';
	const inksUsed = inks.reduce((most, ink) => Math.max(most, ink + 1), 0);
	const proof = { kind: 'not-proved' as const, regions: [] };
	desk.trial.show({
		label: `inks found for revision ${revision}`,
		document: desk.draft.document,
		inks: Int32Array.from(inks),
		answer: { status: 'coloured', inks, inksUsed, lowerBound: 0, proof, sentence },
		lookOnly: true,
	});
	desk.view = 'sheet';
	return '';
}
