import type { ClassMethod } from '../theme.ts';
import { equalSteps } from './equal-steps.ts';
import { headTail } from './head-tail.ts';
import { extremes } from './moments.ts';
import { naturalBreaks } from './natural-breaks.ts';
import { quantiles } from './quantiles.ts';
import { roundedLimits } from './rounded-limits.ts';
import { standardDeviations } from './standard-deviations.ts';

export interface Classing {
	method: ClassMethod;
	/** asked for, 1 or more */
	classes: number;
	/** by hand: the limits as they stand */
	breaks: readonly number[];
	rounded: boolean;
}

/**
 * Limits between classes of these values.
 *
 * In: finite values, any order, none at all among them. Out: limits strictly ascending, at most
 * `classes - 1`; every one has a value below or on it and one above it, but for those set by hand, which
 * stay as they are. Fewer come out where values coincide, fewer are distinct, or a method finds fewer.
 * Equal values are in one class (`classOf`). Rounded limits keep every value in its class.
 */
export function classLimits(values: readonly number[], classing: Classing): number[] {
	const { method, classes, breaks, rounded } = classing;
	if (method === 'by-hand') return ascending(breaks);
	if (values.length === 0) return [];
	const { least, most } = extremes(values);
	const limits = ascending(found(values, method, classes)).filter(
		(limit) => limit >= least && limit < most,
	);
	return rounded ? roundedLimits(limits, values) : limits;
}

function found(values: readonly number[], method: ClassMethod, classes: number): number[] {
	switch (method) {
		case 'natural-breaks':
			return naturalBreaks(values, classes).slice(0, -1);
		case 'quantiles':
			return quantiles(values, classes).slice(0, -1);
		case 'equal-steps':
			return equalSteps(values, classes).slice(0, -1);
		case 'standard-deviations':
			return standardDeviations(values, classes);
		case 'head-tail':
			return headTail(values, classes);
		case 'by-hand':
			return [];
	}
}

const ascending = (limits: readonly number[]): number[] =>
	[...new Set(limits)].sort((one, other) => one - other);
