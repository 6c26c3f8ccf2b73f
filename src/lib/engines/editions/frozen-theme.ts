import type { Ink } from '../palettes/palette.ts';
import type { SheetTheme } from '../sheet/themed.ts';

/**
 * The classes of a themed edition as they were when it was issued. It holds no figure of any region: only
 * limits, the class of each region, and that some were suppressed.
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
}

/** In: keys in the order of the theme's classes. */
export const freezeTheme = (
	keys: readonly string[],
	{ classes, inks, told, title, note }: SheetTheme,
	figuresAt: string | null,
): FrozenTheme => ({
	...{ title, note, told, figuresAt },
	inks: structuredClone(inks),
	classes: Object.fromEntries(keys.map((key, region) => [key, classes[region]])),
});

/** Back, in the order of these keys; a region that the edition does not know is in no class. */
export const thawTheme = (
	keys: readonly string[],
	{ classes, inks, told, title, note }: FrozenTheme,
): SheetTheme => ({
	...{ title, note, told, inks },
	classes: Int32Array.from(keys, (key) => (Object.hasOwn(classes, key) ? classes[key] : told)),
});
