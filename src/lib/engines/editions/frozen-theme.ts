import type { Ink } from '../palettes/palette.ts';
import type { SheetTheme } from '../sheet/themed.ts';

/**
 * The classes of a themed edition as they were when it was issued: limits, the class of each region, and that
 * some were suppressed. It holds figures only where the theme says that files carry them, and never those
 * that were suppressed.
 */
export interface FrozenTheme {
	title: string;
	note: string;
	/** a class each, named by its range, after them those of regions that are not told */
	inks: Ink[];
	told: number;
	/** region key -> number into `inks` */
	classes: Record<string, number>;
	/** when the figures were taken over, ISO 8601; null where nothing says so */
	figuresAt: string | null;
	/** region key -> the figure that was classed; absent unless files carry figures */
	figures?: Record<string, number>;
}

/** In: keys in the order of the theme's classes; figures where files carry them, in the same order. */
export const freezeTheme = (
	keys: readonly string[],
	{ classes, inks, told, title, note }: SheetTheme,
	figuresAt: string | null,
	figures: readonly (number | null)[] | null = null,
): FrozenTheme => ({
	...{ title, note, told, figuresAt },
	inks: structuredClone(inks),
	classes: Object.fromEntries(keys.map((key, region) => [key, classes[region]])),
	...(figures && { figures: toldOf(keys, classes, told, figures) }),
});

/** Only of regions in a class, whatever was handed in. */
const toldOf = (
	keys: readonly string[],
	classes: ArrayLike<number>,
	told: number,
	figures: readonly (number | null)[],
): Record<string, number> =>
	Object.fromEntries(
		keys.flatMap((key, region) => {
			const figure = figures[region];
			return figure !== null && classes[region] < told ? [[key, figure]] : [];
		}),
	);

/** Back, in the order of these keys; a region that the edition does not know is in no class. */
export const thawTheme = (
	keys: readonly string[],
	{ classes, inks, told, title, note }: FrozenTheme,
): SheetTheme => ({
	...{ title, note, told, inks },
	classes: Int32Array.from(keys, (key) => (Object.hasOwn(classes, key) ? classes[key] : told)),
});

/** The figures that were issued, in the order of these keys; null where the edition holds none. */
export const thawFigures = (
	keys: readonly string[],
	{ figures }: FrozenTheme,
): (number | null)[] | null =>
	figures ? keys.map((key) => (Object.hasOwn(figures, key) ? figures[key] : null)) : null;
