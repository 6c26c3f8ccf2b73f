import type { SheetLayout } from '$lib/engines/sheet/layout';
import type { Desk } from '$lib/state/desk.svelte';
import { setLayout } from '$lib/state/draft-edits';

/** Changes of the layout as handlers of controls; typing on in one field is one step to undo. */
export function layoutHand(desk: Desk) {
	const set = (what: string, change: Partial<SheetLayout>) =>
		desk.draft.change(`change ${what}`, setLayout(change), true);
	return {
		set,
		text: (name: 'title' | 'subtitle' | 'credits') => (event: Event) =>
			set(`the ${name}`, { [name]: (event.currentTarget as HTMLInputElement).value }),
		tick: (name: 'labels' | 'legend' | 'scaleBar', what: string) => (event: Event) =>
			set(what, { [name]: (event.currentTarget as HTMLInputElement).checked }),
		pick: (apply: (value: string) => void) => (event: Event) =>
			apply((event.currentTarget as HTMLSelectElement).value),
	};
}

/** `A4 landscape`, `420 by 297 mm`. */
export const paperWords = ({ paper, orientation }: SheetLayout): string =>
	typeof paper === 'string'
		? `${paper} ${orientation}`
		: `${paper.widthMm} by ${paper.heightMm} mm`;
