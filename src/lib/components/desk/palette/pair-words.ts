import type { PairState } from '$lib/engines/palettes';
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
