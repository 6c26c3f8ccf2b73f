import { limitWords } from '../measures/classing/range-words.ts';
import type { ThemeClasses } from '../measures/theme-classes.ts';
import type { Theme } from '../measures/theme.ts';
import type { Hatch, Ink } from '../palettes/palette.ts';
import { rampInks } from '../palettes/ramp-inks.ts';
import { rampOf, ramps } from '../palettes/ramps.ts';
import type { SheetTheme } from './themed.ts';

/** Where the figures come from, for the note at the sheet's foot. */
export interface ThemeSource {
	/** name of the table; null for none */
	table: string | null;
	/** when the figures were taken over, in words */
	date: string | null;
	/** whether the limits are still what the method gives for them */
	holds: boolean;
}

/** A grey of paper, not a pale class: a hatch tells these regions, never a colour alone. */
const ground = '#ececec';
const lines: Hatch = { kind: 'lines', angle: 45, spacingMm: 1.2, widthMm: 0.16, hex: '#6b6b6b' };
const crossed: Hatch = { ...lines, kind: 'crossed', angle: 45, spacingMm: 1.6 };

/** Inks of regions without a class, in the order of their numbers after the classes. */
export const unlessTold: readonly Ink[] = [
	{ name: 'no data', hex: ground, hatch: lines },
	{ name: 'suppressed', hex: ground, hatch: crossed },
];

/**
 * A theme as the sheet shows it: colours, ranges and classes, without any figure but the limits.
 *
 * In: a theme, its classes, where its figures come from. Out: as `SheetTheme`; a ramp that is not known any
 * more is drawn as the first.
 */
export function sheetTheme(theme: Theme, classes: ThemeClasses, source: ThemeSource): SheetTheme {
	const ramp = rampOf(theme.ramp) ?? ramps[0];
	const { ranges } = classes;
	const hexes = rampInks(ramp, ranges.length, {
		reversed: theme.reversed,
		turn: turnOf(theme, classes),
	});
	return {
		classes: classes.classes,
		inks: [...ranges.map((name, one) => ({ name, hex: hexes[one] })), ...unlessTold],
		told: ranges.length,
		title: theme.title,
		note: noteOf(theme, classes, source),
	};
}

/**
 * Where a diverging ramp turns, counted in classes: on a limit, or within the class that holds its middle;
 * undefined for the middle class.
 */
export function turnOf(
	{ middle }: Pick<Theme, 'middle'>,
	{ limits, mean }: Pick<ThemeClasses, 'limits' | 'mean'>,
): number | undefined {
	const value = middle === 'mean' ? mean : middle;
	if (value === null) return undefined;
	const on = limits.indexOf(value);
	return on >= 0 ? on + 1 : limits.filter((limit) => limit < value).length + 0.5;
}

const methodWords: Record<Theme['method'], string> = {
	'natural-breaks': 'natural breaks',
	quantiles: 'quantiles',
	'equal-steps': 'equal steps',
	'standard-deviations': 'standard deviations from the mean',
	'head-tail': 'head/tail breaks',
	'by-hand': 'limits set by hand',
};

function noteOf(theme: Theme, { suppressed }: ThemeClasses, source: ThemeSource): string {
	const rounded = theme.rounded && theme.method !== 'by-hand' ? ', limits rounded' : '';
	const method = source.holds
		? `Classes: ${methodWords[theme.method]}${rounded}`
		: 'Classes: limits kept from earlier figures';
	const from = [source.table, source.date].filter(Boolean).join(', ');
	return [
		`${method}; a figure on a limit is in the lower class.`,
		suppressed.length && theme.suppressBelow !== null
			? `Counts above 0 and below ${limitWords([theme.suppressBelow])[0]} are suppressed.`
			: '',
		from ? `Figures: ${from}.` : '',
	]
		.filter(Boolean)
		.join(' ');
}
