import { length } from '../components/format.ts';
import { borderKinds, isAcross } from '../engines/borders/border-list.ts';
import type { CountingRule, Standing } from '$lib/engines/borders/standing';

/** Borders in words, the same in the table, beside a region and in what is pointed out. */

export const kindWords: Record<(typeof borderKinds)[number], string> = {
	line: 'shared line',
	point: 'point touch',
	water: 'across water',
	gap: 'across water',
	hand: 'added by hand',
};

/** The kinds that people tell apart, as a choice. */
export const kindChoices = [...new Set(Object.values(kindWords))];

/** Whether a border counts, or why not, in a word or two. */
export const standingWords: Record<Standing, string> = {
	counts: 'counts',
	'point-not-counted': 'not counted: a point',
	'too-short': 'not counted: too short',
	'too-far': 'not counted: too far',
	'water-not-counted': 'not counted: across water',
	struck: 'struck out',
};

/** How long a shared line is or how wide a gap; a point touch has neither. */
export const measureOf = ({ kind, metres }: { kind: number; metres: number }): string =>
	isAcross(kind) ? `${length(metres)} apart` : metres ? length(metres) : 'none';

/** How wide a gap may be, as the rule says it. */
export const waterWords = (waterKm: CountingRule['waterKm']): string =>
	waterKm === null
		? 'as the file was read'
		: waterKm === 0
			? 'none'
			: `up to ${length(waterKm * 1000)}`;
