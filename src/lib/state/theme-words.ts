import { counted, roundedDown } from '$lib/components/format';
import type { ClassMethod, Theme } from '$lib/engines/measures/theme';
import type { ReaderVerdict, RampVerdict } from '$lib/engines/palettes/ramp-verdict';
import type { SheetTheme } from '$lib/engines/sheet/themed';
import type { ThemeTrouble } from '$lib/schemas/desk-theme';
import type { DocketStage, DocketWords } from './docket';

/** The longest heading of a legend that a theme can have. */
const longestTitle = 300;

/** Heading of the legend while nobody wrote another: the figure, its unit, what it is divided by. */
export function autoTitle({ measure, per }: Pick<Theme, 'measure' | 'per'>, unit: string): string {
	const what = unit ? `${measure}, ${unit}` : measure;
	return `${what}${perWords(per)}`.slice(0, longestTitle);
}

function perWords(per: Theme['per']): string {
	if (per.kind === 'none') return '';
	if (per.kind === 'area') return ' per km²';
	return per.times === 1
		? ` per ${per.measure}`
		: ` per ${manyDigits.format(per.times)} ${per.measure}`;
}

/** `For every 0.5` is half, and never the nought that a whole number would make of it. */
const manyDigits = new Intl.NumberFormat('en-GB', { maximumSignificantDigits: 15 });

export const methodWords: Record<ClassMethod, { label: string; what: string }> = {
	'natural-breaks': {
		label: 'natural breaks',
		what: 'Figures that lie close together fall into one class (Fisher 1958).',
	},
	quantiles: { label: 'quantiles', what: 'As equal a number of regions in each class as can be.' },
	'equal-steps': { label: 'equal steps', what: 'Every class is equally wide.' },
	'standard-deviations': {
		label: 'standard deviations',
		what: 'Limits at whole standard deviations from the mean; for a diverging ramp.',
	},
	'head-tail': {
		label: 'head/tail breaks',
		what: 'For a few large figures and many small: limits at the mean, then at the mean of what is above it (Jiang 2013).',
	},
	'by-hand': { label: 'by hand', what: 'The limits are yours: drag them, or type them in.' },
};

export const troubleWords: Record<ThemeTrouble, string> = {
	gone: 'The measure that the sheet shows is no longer joined to it, so every region is without data.',
	stale:
		'The figures are joined to earlier boundaries, so every region is without data. Join the table again.',
};

/** What is said where no region has a class; '' where one has. */
export function untoldWords({ classes, told }: Pick<SheetTheme, 'classes' | 'told'>): string {
	if (classes.some((one) => one < told)) return '';
	const noData = classes.filter((one) => one === told).length;
	if (noData === classes.length)
		return 'No region has a figure: every value is missing, or has nothing that it can be divided by.';
	if (noData === 0) return 'No region has a class: every count is suppressed.';
	return 'No region has a class: every figure is missing or suppressed.';
}

/** "Classes 1 and 2 differ by 6.7, of 10 asked" */
export function pairWords({ a, b, found, asked, reader }: ReaderVerdict): string {
	const by = reader === 'grey' ? 'in lightness' : '';
	const pair = `Classes ${a + 1} and ${b + 1} differ least: ${roundedDown(found)}`;
	return `${pair}${by && ` ${by}`}, ${asked} asked`;
}

/** A sentence of the palette's as part of one about classes. */
export const inSentence = (sentence: string): string =>
	sentence.replace(/\binks\b/g, 'classes').replace(/^(Every|No)\b/, (word) => word.toLowerCase());

/** One sentence about a ramp in so many classes. */
export function rampSentence(
	{ readers, ordered }: RampVerdict,
	short: (one: ReaderVerdict) => string,
) {
	const wrong = readers.filter(({ severity }) => severity === 'error');
	const weak = readers.filter(({ severity }) => severity === 'warning');
	const pairs = (list: ReaderVerdict[]) =>
		list.map((one) => `${short(one)} (${one.a + 1} and ${one.b + 1})`).join(', ');
	if (wrong.length) return `Look alike: ${pairs(wrong)}`;
	if (!ordered) return 'Told apart by all, but grey print loses the order';
	return weak.length ? `Close: ${pairs(weak)}` : 'Clear to all readers';
}

export interface ThemeState {
	title: string;
	told: number;
	/** regions that are not told */
	untold: number;
	trouble: ThemeTrouble | null;
	holds: boolean;
	/** whether a count fills areas and nobody said that it is a rate */
	misleads: boolean;
	/** whether some reader takes two classes for one another */
	alike: boolean;
}

/** What the docket says of the theme. */
export function themeStage(theme: ThemeState | null): DocketStage {
	const stage = { id: 'theme', title: 'Theme' } as const;
	if (!theme)
		return { ...stage, mark: null, words: [{ text: 'None: the sheet shows its colouring' }] };
	const { title, told, untold, trouble, holds, misleads, alike } = theme;
	const shown: DocketWords = {
		text: `${title || 'A measure'} in ${counted(told, 'class', 'classes')}`,
		to: '#classes',
	};
	const more: DocketWords[] = [];
	if (trouble) more.push({ text: 'Its figures are missing', to: '#theme' });
	else if (!holds) more.push({ text: 'Limits are of earlier figures', to: '#theme' });
	else if (misleads) more.push({ text: 'A count fills areas', to: '#theme' });
	else if (alike) more.push({ text: 'Some classes look alike', to: '#classes' });
	else if (untold) more.push({ text: `${counted(untold, 'region')} not told`, to: '#classes' });
	const mark = trouble ? 'error' : !holds || misleads || alike ? 'warning' : 'clear';
	return { ...stage, mark, words: [shown, { text: '.' }, ...more] };
}
