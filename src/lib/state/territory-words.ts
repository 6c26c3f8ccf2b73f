import { count, counted } from '$lib/components/format';
import type { Torn } from '$lib/engines/territories';
import type { TerritoryEntry } from '$lib/engines/territories/territory-draft';
import type { TerritoryState } from './docket';
import type { TerritoryDesk } from './territories.svelte';
import type { Figure, Loads } from './territory-figures';

/** What the desk says of territories, in the words of those who plan them. */

const percent = new Intl.NumberFormat('en-GB', {
	minimumFractionDigits: 1,
	maximumFractionDigits: 1,
});

/** 0.124 -> "12.4 %" */
export const percentage = (value: number): string => `${percent.format(value * 100)} %`;

/** A tolerance as it was typed: no decimals that say nothing. */
export const toleranceWords = (value: number): string =>
	`${Number((value * 100).toFixed(2)).toLocaleString('en-GB')} %`;

/** 0.124 -> "12.4 % over" */
export function deviationWords(deviation: number): string {
	if (Number.isNaN(deviation)) return 'no target';
	if (Math.abs(deviation) < 0.0005) return 'on target';
	return `${percentage(Math.abs(deviation))} ${deviation > 0 ? 'over' : 'under'}`;
}

const amounts = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 1 });

/** A load with its unit: whole from a hundred on. */
export const amount = (value: number, unit: string): string =>
	`${Math.abs(value) < 100 ? amounts.format(value) : count(value)}${unit ? ` ${unit}` : ''}`;

/** An average unit above this share of the tolerance leaves a search little room; a rule of thumb. */
const tight = 0.5;

/**
 * Units per territory and the largest unit, before anything else: whether a tolerance can be met at all.
 * `hard` says that it will be hard; `cannot` that one region alone is too heavy.
 */
export function roomSentence(
	{ name, tolerance, values }: Figure,
	{ fullTarget, total }: Loads,
	territories: number,
	nameOf: (region: number) => string,
): { room: 'wide' | 'hard' | 'cannot'; words: string } | null {
	if (tolerance === null || !territories || !(fullTarget > 0) || !total) return null;
	const each = Math.round(values.length / territories);
	const largest = values.reduce((best, value, region) => (value > values[best] ? region : best), 0);
	const share = values[largest] / fullTarget;
	const units = `${counted(each, 'region')} a territory`;
	const heavy = `the largest region, ${nameOf(largest)}, is ${percentage(share)} of a target`;
	const asked = `A tolerance of ${toleranceWords(tolerance)} in ${name}`;
	if (share > 1 + tolerance)
		return {
			room: 'cannot',
			words: `${asked} cannot be met by a full share: ${nameOf(largest)} alone is ${percentage(share)} of a target.`,
		};
	if (values.length && territories / values.length > tight * tolerance)
		return { room: 'hard', words: `${asked} with ${units} is hard: ${heavy}.` };
	return { room: 'wide', words: `${asked} with ${units} leaves room: ${heavy}.` };
}

/** "Driving, hours"; a measure that is called like its unit is named once. */
export const measureLabel = (name: string, unit: string): string =>
	!unit || unit.toLocaleLowerCase() === name.toLocaleLowerCase() ? name : `${name}, ${unit}`;

/** Load over target with 100 for the target itself: "104.2"; nothing without a target. */
export const indexWords = (load: number, target: number): string =>
	target > 0 ? percent.format((100 * load) / target) : '';

/** How many pieces a territory is in; 1 unless it is torn. */
export const piecesOf = (torn: readonly Torn[], territory: number): number =>
	torn.find((one) => one.territory === territory)?.parts.filter(({ length }) => length > 0)
		.length ?? 1;

/** "frozen, in 2 parts": what stands out about a territory beside its load. */
export function stateWords(
	{ frozen, vacant, closing }: TerritoryEntry,
	torn: readonly Torn[],
	territory: number,
): string {
	const isTorn = torn.some((one) => one.territory === territory);
	const pieces = piecesOf(torn, territory);
	return [
		isTorn ? (pieces > 1 ? `torn into ${pieces} parts` : 'cut off from its base') : '',
		frozen ? 'frozen' : '',
		vacant ? 'vacant' : '',
		closing ? 'closing' : '',
	]
		.filter(Boolean)
		.join(', ');
}

/** What the docket says of the territories as they stand. */
export function territoryState(plan: TerritoryDesk): TerritoryState {
	const { entries, torn, outside, counts, figures } = plan;
	const tolerances = new Set(figures.flatMap(({ tolerance }) => tolerance ?? []));
	const [one] = tolerances;
	return {
		territories: entries.length,
		torn: torn.length,
		outside: outside.length,
		tolerance: tolerances.size === 1 ? toleranceWords(one) : 'a tolerance',
		without: counts.without,
	};
}
