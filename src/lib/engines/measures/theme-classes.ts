import { classLimits } from './classing/class-limits.ts';
import { classOf } from './classing/class-of.ts';
import { rangeWords } from './classing/range-words.ts';
import { mean } from './classing/moments.ts';
import { themeFigures, type ThemeFigures, type ThemeGround } from './theme-figures.ts';
import type { Theme } from './theme.ts';

export interface ThemeClasses extends ThemeFigures {
	/** between classes, ascending */
	limits: number[];
	/** a class, lowest first, in words */
	ranges: string[];
	/** class of every region, from 0; `ranges.length` for no data, one more for suppressed */
	classes: Int32Array;
	/** regions in each class */
	counts: number[];
	/** mean of the figures told; null where there are none */
	mean: number | null;
}

/** The numbers that stand for regions without a class, after those of the classes. */
export const noDataAfter = 0;
export const suppressedAfter = 1;

/**
 * Every region's class by the limits that a theme names. In: a theme, its ground. Out: see `ThemeClasses`;
 * classes are those of `theme.breaks`, whatever the method, so that a theme shows what was agreed even
 * when figures have changed since. `limitsOf` says what the method would give now.
 */
export function themeClasses(theme: Theme, ground: ThemeGround): ThemeClasses {
	const told = themeFigures(theme, ground);
	const limits = [...theme.breaks];
	const ranges = rangeWords(limits);
	const classes = Int32Array.from(told.figures, (figure) =>
		figure === null ? ranges.length + noDataAfter : classOf(figure, limits),
	);
	for (const region of told.suppressed) classes[region] = ranges.length + suppressedAfter;
	const counts = ranges.map(() => 0);
	for (const one of classes) if (one < counts.length) counts[one]++;
	const known = toldFigures(told);
	return { ...told, limits, ranges, classes, counts, mean: known.length ? mean(known) : null };
}

export const toldFigures = ({ figures }: Pick<ThemeFigures, 'figures'>): number[] =>
	figures.filter((figure) => figure !== null);

/** The limits that a theme's method gives for the figures told, suppressed ones left out. */
export const limitsOf = (theme: Theme, ground: ThemeGround): number[] =>
	classLimits(toldFigures(themeFigures(theme, ground)), theme);

/** Whether a theme's limits are what its method gives now; those set by hand always hold. */
export function limitsHold(theme: Theme, ground: ThemeGround): boolean {
	if (theme.method === 'by-hand') return true;
	const now = limitsOf(theme, ground);
	return now.length === theme.breaks.length && now.every((limit, i) => limit === theme.breaks[i]);
}
