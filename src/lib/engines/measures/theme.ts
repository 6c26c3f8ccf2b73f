/** A themed map of a measure: which figure, in which classes, in which ramp. */
export interface Theme {
	/** name of the measure */
	measure: string;
	/** what the figure is divided by; a plain count on areas misleads */
	per: ThemePer;
	/** somebody said that the figure is a rate already, so nothing warns of a count on areas */
	isRate: boolean;
	method: ClassMethod;
	/** asked for, 2 to 12; some figures and methods give fewer */
	classes: number;
	/** limits between classes, ascending, fewer than `classes`; a value on a limit is in the lower class */
	breaks: number[];
	/** whether limits are moved to round figures that leave every region in its class */
	rounded: boolean;
	/** id of a ramp */
	ramp: string;
	reversed: boolean;
	/** what a diverging ramp turns at: the mean of the figures told, or a figure; null: the middle class */
	middle: 'mean' | number | null;
	/** regions whose count is above 0 and below this are not told; null: every figure is */
	suppressBelow: number | null;
	/** files and editions carry the figures that are told, besides their classes; absent: they do not */
	figuresInFiles?: boolean;
	/** heading of the legend: what the figures are and their unit */
	title: string;
}

export type ThemePer =
	{ kind: 'none' } | { kind: 'area' } | { kind: 'measure'; measure: string; times: number };

export const classMethods = [
	'natural-breaks',
	'quantiles',
	'equal-steps',
	'standard-deviations',
	'head-tail',
	'by-hand',
] as const;
export type ClassMethod = (typeof classMethods)[number];

export const mostClasses = 12;
