import { area, count, counted, length } from '$lib/components/format';
import { readerWords } from '$lib/components/desk/reader-words';
import type { GoalFigure } from '$lib/engines/colouring/goal-figures';
import type { GoalKind } from '$lib/engines/colouring/goal-wish';
import { inkDistances, readers, type Reader } from '$lib/engines/palettes';
import type { Ink } from '$lib/engines/palettes/palette';
import type { WeakestNews } from './improving.svelte';

/** What an aim is called, and what it does in one sentence. */
export const aimWords: Record<GoalKind, { title: string; sentence: string }> = {
	'fewest-changes': {
		title: 'Fewest changes',
		sentence: 'As few regions as can be get another ink than they had before.',
	},
	'even-count': {
		title: 'Even use, by regions',
		sentence: 'Every ink colours as many regions as every other.',
	},
	'even-area': {
		title: 'Even use, by area',
		sentence: 'Every ink covers as much ground as every other.',
	},
	distinct: {
		title: 'Distinct neighbours',
		sentence:
			'The two inks that are easiest to confuse share the shortest border; then the next two.',
	},
	'same-ink-apart': {
		title: 'Same ink far apart',
		sentence: 'As few regions of one ink as can be lie on two sides of the same region.',
	},
};

/** How much of its gain an aim may give back to those after it. */
export const giveChoices: readonly { value: string; label: string }[] = [
	{ value: '0', label: 'nothing of what it gains' },
	{ value: '0.05', label: 'a twentieth of what it gains' },
	{ value: '0.1', label: 'a tenth of what it gains' },
	{ value: '0.25', label: 'a quarter of what it gains' },
	{ value: '0.5', label: 'half of what it gains' },
];

/** One figure of a colouring in words: its name, and what it comes to, with the unit. */
export interface FigureLine {
	name: string;
	value: string;
}

/** What a colouring comes to for one aim, in lines that stand beside each other before and after. */
export function figureLines(
	figure: GoalFigure,
	inks: readonly Ink[],
	seenBy: readonly Reader[] = readers,
): FigureLine[] {
	switch (figure.kind) {
		case 'fewest-changes':
			return [{ name: `Changed, of ${count(figure.of)} regions`, value: count(figure.changed) }];
		case 'even-count':
			return loadLines(figure.loads, (load) => counted(load, 'region'));
		case 'even-area':
			return loadLines(figure.loads, area);
		case 'same-ink-apart':
			return [
				{ name: 'Times two neighbours of a region share an ink', value: count(figure.pairs) },
			];
		case 'distinct':
			return distinctLines(figure, inks, seenBy);
	}
}

function loadLines(loads: readonly { load: number }[], words: (load: number) => string) {
	const all = loads.map(({ load }) => load);
	const [most, least] = [Math.max(...all), Math.min(...all)];
	return [
		{ name: 'Most used ink', value: words(most) },
		{ name: 'Least used ink', value: words(least) },
		{ name: 'Between them', value: words(most - least) },
	];
}

function distinctLines(
	{ smallest, mean }: Extract<GoalFigure, { kind: 'distinct' }>,
	inks: readonly Ink[],
	seenBy: readonly Reader[],
): FigureLine[] {
	if (!smallest || mean === null) return [{ name: 'Inks that touch', value: 'none' }];
	const { a, b, distance, metres } = smallest;
	const reader = weakestReader(inks[a]?.hex, inks[b]?.hex, seenBy);
	return [
		{
			name: 'Smallest difference',
			value: distance.toFixed(1),
		},
		{ name: 'Seen by', value: reader ? readerWords[reader].short : 'nobody' },
		{ name: 'Between inks', value: `${a + 1} and ${b + 1}` },
		{ name: 'Along', value: length(metres) },
		{ name: 'Mean difference', value: mean.toFixed(1) },
	];
}

/** Who sees two inks least apart. */
export function weakestReader(
	one: string | undefined,
	two: string | undefined,
	seenBy: readonly Reader[],
): Reader | null {
	if (!one || !two) return null;
	let weakest: { reader: Reader; distance: number } | null = null;
	for (const reader of seenBy) {
		const distance = inkDistances([one, two], [reader])[0][1];
		if (!weakest || distance < weakest.distance) weakest = { reader, distance };
	}
	return weakest?.reader ?? null;
}

/** Whether the two weakest inks need touch at all. */
export function weakestSentence({ a, b, distance, avoidable }: WeakestNews): string {
	const pair = `Inks ${a + 1} and ${b + 1} are the two least apart (${distance.toFixed(1)})`;
	if (avoidable === 'yes') return `${pair}. They need not touch anywhere.`;
	if (avoidable === 'no')
		return `${pair}. They must touch somewhere: kept apart they would count as one ink, and one ink fewer does not do.`;
	return `${pair}. Whether they must touch somewhere was not settled.`;
}
