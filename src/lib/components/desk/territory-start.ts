import type { Desk } from '$lib/state/desk.svelte';
import { browserKeeper } from '$lib/state/kept-drafts';
import { saveTo } from '$lib/state/save-draft';
import type { TerritoryStart } from '$lib/state/territories.svelte';

/** Where the territories of a sheet are saved and kept. */
export const territoryStart = ({ address }: Desk): Omit<TerritoryStart, 'given' | 'desk'> => ({
	save: saveTo(`${address}/territories/draft`),
	keeper: 'indexedDB' in globalThis ? browserKeeper() : null,
});
