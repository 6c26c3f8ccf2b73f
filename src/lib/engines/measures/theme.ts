/** A themed map of a measure: which figure, in which classes, in which ramp. */
export interface Theme {
	/** name of the measure */
	measure: string;
	/** what the figure is divided by; a plain count on areas misleads */
	per: { kind: 'none' } | { kind: 'area' } | { kind: 'measure'; measure: string; times: number };
	method: ClassMethod;
	/** 2 to 12 */
	classes: number;
	/** limits between classes, ascending, one fewer than classes; a value on a limit is in the lower class */
	breaks: number[];
	/** id of a ramp */
	ramp: string;
	reversed: boolean;
	/** regions whose count is above 0 and below this are not told; null: every figure is */
	suppressBelow: number | null;
	/** heading of the legend: what the figures are and their unit */
	title: string;
}

export const classMethods = [
	'natural-breaks',
	'quantiles',
	'equal-steps',
	'standard-deviations',
	'head-tail',
	'by-hand',
] as const;
export type ClassMethod = (typeof classMethods)[number];
