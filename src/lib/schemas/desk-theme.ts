import type { Ink } from '../engines/palettes/palette.ts';
import type { DeskMeasure } from './desk-territories.ts';

/** Why a theme has nothing to show: its measure was removed, or belongs to earlier boundaries. */
export type ThemeTrouble = 'gone' | 'stale';

/** The themed sheet as every page is given it: classes and ranges, never a figure. */
export interface DeskTheme {
	/** class of each region, a number into `inks` */
	classes: number[];
	inks: Ink[];
	/** how many of the inks are classes; the others are of regions that are not told */
	told: number;
	title: string;
	note: string;
	trouble: ThemeTrouble | null;
	/** whether the limits are what the method gives for today's figures */
	holds: boolean;
	/** when the figures were taken over, ISO 8601 */
	figuresAt: string | null;
}

/** A measure as the stage of the theme is given it, for whoever may see figures. */
export interface ThemeMeasure extends DeskMeasure {
	/** when its table was taken over, ISO 8601 */
	takenAt: string | null;
}
