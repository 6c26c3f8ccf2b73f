import type { BesideColour, PairState } from '$lib/engines/palettes';
import { counted } from '../../format';
import type { MarkKind } from '../../Mark.svelte';

/** What stands beside a value, and how it is read out; nothing where all is well. */
export const markOfState: Record<PairState, MarkKind | null> = {
	...{ clear: null, near: null, hatch: null },
	...{ weak: 'warning', alike: 'error' },
};

export const stateWords: Record<PairState, string> = {
	clear: 'Clear',
	near: 'Enough',
	hatch: 'By hatch',
	weak: 'Weak',
	alike: 'Alike',
};

const tenth = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 1 });

/** 3.46 -> "3.4 mm": rounded down, so that no size is shown as the step that it misses. */
export const millimetres = (mm: number): string => `${tenth.format(Math.floor(mm * 10) / 10)} mm`;

/** What helps the regions under 3.5 mm. In: how many of them carry neither a name nor a number. */
export function besideWords(beside: BesideColour, bare: number): string {
	if (beside === 'hatch') return 'Under 3.5 mm a fill is not enough: the hatches tell them apart.';
	if (beside === 'labels')
		return 'Under 3.5 mm a fill is not enough: the border line and their labels help.';
	return `Under 3.5 mm a fill is not enough, and ${counted(bare, 'region has', 'regions have')} neither a name, a number nor a hatch on the sheet.`;
}
