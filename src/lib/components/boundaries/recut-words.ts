import type { BorderKind } from '$lib/engines/borders/border-list';
import type { PairChange, RecutOutcome, RecutRow } from '$lib/schemas/recut';
import { counted, length } from '../format';
import type { MarkKind } from '../Mark.svelte';

export const stateWords: Record<RecutRow['state'], string> = {
	waiting: 'waiting to be read',
	reading: 'being read',
	asking: 'has a question',
	ready: 'ready to be looked at',
	applied: 'applied',
	'put-back': 'put back',
	dropped: 'dropped',
	refused: 'refused',
	cancelled: 'cancelled',
	failed: 'failed',
};

const marks: Partial<Record<RecutRow['state'], MarkKind>> = {
	...{ asking: 'warning', ready: 'warning', applied: 'clear', refused: 'error', failed: 'error' },
};
export const stateMark = (state: RecutRow['state']): MarkKind | null => marks[state] ?? null;

export const outcomeWords: Record<RecutOutcome, string> = {
	kept: 'kept',
	renamed: 'renamed',
	split: 'split',
	merged: 'merged',
	redrawn: 'redrawn',
	new: 'new',
	gone: 'gone',
};

export const outcomes: readonly RecutOutcome[] = [
	...(['kept', 'renamed', 'redrawn', 'split', 'merged', 'gone', 'new'] as const),
];

/** "171 kept, 3 renamed, 1 split": what there is none of is left out. */
export const countWords = (counts: Record<RecutOutcome, number>): string =>
	outcomes
		.filter((outcome) => counts[outcome])
		.map((outcome) => `${counts[outcome].toLocaleString('en-GB')} ${outcomeWords[outcome]}`)
		.join(', ');

export const groupReason = { key: 'by key', area: 'by area', hand: 'by hand' };

const borders: Record<BorderKind, string> = {
	line: 'by line',
	point: 'by point',
	water: 'across water',
	gap: 'across water',
	hand: 'by hand',
};

export function sideWords(side: PairChange['before']): string {
	if (!side) return 'none';
	return side.metres > 0 ? `${borders[side.kind]}, ${length(side.metres)}` : borders[side.kind];
}

/** What a re-cut does to the regions and borders, in one sentence. */
export function changeSentence(
	regions: { before: number; after: number },
	pairs: { gained: number; lost: number; changed: number },
): string {
	const many =
		regions.before === regions.after
			? `${counted(regions.after, 'region')} as before`
			: `${counted(regions.after, 'region')} instead of ${regions.before.toLocaleString('en-GB')}`;
	const told = [
		pairs.gained && `${counted(pairs.gained, 'pair')} gained`,
		pairs.lost && `${counted(pairs.lost, 'pair')} lost`,
		pairs.changed && `${counted(pairs.changed, 'border')} changed`,
	].filter(Boolean);
	return `${many}; ${told.length ? told.join(', ') : 'every border stays as it is'}.`;
}
