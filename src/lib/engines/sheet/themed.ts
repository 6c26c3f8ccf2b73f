import type { Ink } from '../palettes/palette.ts';
import type { RegionFill, SheetThemed } from './drawing.ts';
import type { SheetLayout } from './layout.ts';

/** A themed map as the sheet needs it: figures are no part of it. */
export interface SheetTheme {
	/** class of every region, a number into `inks` */
	classes: Int32Array;
	/** an ink a class, lowest first, named by its range; after them those of regions that are not told */
	inks: Ink[];
	/** how many of the inks are classes */
	told: number;
	/** heading of the legend */
	title: string;
	/** how the classes were made and of which figures, in a sentence */
	note: string;
}

interface Shown {
	colouring: Int32Array | null;
	inks: Ink[];
	layout: SheetLayout;
	weak: readonly unknown[];
	theme?: SheetTheme | null;
}

/**
 * What a sheet shows: classes in place of the colouring when there is a theme. The theme's title heads the
 * legend unless the layout has a heading of its own; its note stands above the credits.
 */
export function themedInput<T extends Shown>(input: T): T & { themed?: SheetThemed } {
	const { theme, layout } = input;
	if (!theme) return input;
	const { credits, collar } = layout;
	return {
		...input,
		colouring: theme.classes,
		inks: theme.inks,
		weak: [],
		layout: {
			...layout,
			credits: [theme.note, credits].filter(Boolean).join('\n'),
			collar: {
				...collar,
				legendTitle: collar.legendTitle || theme.title,
				// from low to high, whatever the inks of the colouring are ordered by
				legendOrder: 'number',
			},
		},
		themed: { told: theme.told },
	};
}

/**
 * Numbers of the inks that the legend lists: those in use; of a themed sheet every class, empty ones too,
 * and what is in use after them.
 */
export function legendInks(
	fills: readonly Pick<RegionFill, 'ink'>[],
	themed: SheetThemed | undefined,
): number[] {
	const used = new Set(fills.map(({ ink }) => ink));
	for (let one = 0; one < (themed?.told ?? 0); one++) used.add(one);
	return [...used].filter((ink) => ink >= 0).sort((a, b) => a - b);
}

/** What a row of a file says of a region's class: its number from 1, null where it has none, and its range. */
export interface ThemeColumns {
	class: number | null;
	/** "1,200 to 3,400"; "no data", "suppressed" */
	range: string;
}

/** The columns of a themed sheet's tables, by a region's ink. Figures are no part of them. */
export const themeColumns = (
	{ inks, told }: Pick<SheetTheme, 'inks' | 'told'>,
	ink: number,
): ThemeColumns => ({
	class: ink >= 0 && ink < told ? ink + 1 : null,
	range: inks[ink]?.name ?? '',
});
