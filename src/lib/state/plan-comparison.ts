import type { PlanFigures } from '$lib/engines/territories';
import { count, counted } from '$lib/components/format';
import { percentage } from './territory-words';

/** A plan in the comparison: today's territories, or a proposal. */
export interface ComparedPlan {
	/** 0 for today */
	number: number;
	name: string;
	figures: PlanFigures;
	/** null for today */
	bound: { cost: number; lowerBound: number; proved: boolean } | null;
}

export interface ComparisonRow {
	label: string;
	/** one a plan, in words */
	cells: string[];
	/** places of the cells that are best of the proposals, where fewer is better */
	best: number[];
}

type Measure = { name: string; unit: string };

/** The figures of several plans side by side; today comes first and is no candidate for the best. */
export function comparisonRows(
	plans: readonly ComparedPlan[],
	measures: readonly Measure[],
): ComparisonRow[] {
	const row = (
		label: string,
		value: (plan: ComparedPlan) => number,
		words: (value: number, plan: ComparedPlan) => string,
	): ComparisonRow => {
		const values = plans.map(value);
		return {
			label,
			cells: values.map((one, place) => words(one, plans[place])),
			best: bestOf(plans, values),
		};
	};
	return [
		row(
			'Regions moved',
			({ figures }) => figures.movedUnits,
			(moved, { figures }) =>
				moved === 0 ? 'none' : `${count(moved)} (${percentage(figures.movedShare)})`,
		),
		{
			label: 'At least needed',
			cells: plans.map(({ bound }) => (bound ? boundWords(bound) : '')),
			best: [],
		},
		row(
			'Territories outside',
			({ figures }) => new Set(figures.measures.flatMap(({ outside }) => outside)).size,
			(outside) => (outside === 0 ? 'none' : count(outside)),
		),
		row(
			'Territories torn',
			({ figures }) => figures.torn.length,
			(torn) => (torn === 0 ? 'none' : count(torn)),
		),
		...measures.flatMap((measure, m) => [
			row(
				`${measure.name}: largest deviation`,
				({ figures }) => Math.abs(figures.measures[m].largest.deviation),
				(deviation) => (Number.isNaN(deviation) ? 'no target' : percentage(deviation)),
			),
			row(`${measure.name}: mean deviation`, ({ figures }) => figures.measures[m].mean, percentage),
			row(
				`${measure.name}: moved`,
				({ figures }) => figures.measures[m].movedShare,
				(share) => (share === 0 ? 'none' : percentage(share)),
			),
		]),
		row(
			'Borders between territories',
			({ figures }) => figures.cutBorders.after,
			(cut, { figures }) => {
				const more = cut - figures.cutBorders.before;
				return more === 0 ? count(cut) : `${count(cut)} (${more > 0 ? '+' : '−'}${Math.abs(more)})`;
			},
		),
		row(
			'Travel, estimated',
			({ figures }) => travelOf(figures),
			(km) => (Number.isNaN(km) ? 'not known' : `${count(km)} km`),
		),
	];
}

const travelOf = ({ territories }: PlanFigures): number =>
	territories.some(({ travel }) => travel !== null)
		? territories.reduce((sum, { travel }) => sum + (travel?.totalKm ?? 0), 0)
		: NaN;

function boundWords({ cost, lowerBound, proved }: NonNullable<ComparedPlan['bound']>): string {
	if (proved) return `${count(cost)}: proved fewest`;
	return lowerBound > 0 ? count(Math.ceil(lowerBound - 1e-6)) : 'not known';
}

/** Proposals whose figure is the smallest, unless all are alike. */
function bestOf(plans: readonly ComparedPlan[], values: readonly number[]): number[] {
	const candidates = values.flatMap((value, place) =>
		plans[place].bound && !Number.isNaN(value) ? [{ value, place }] : [],
	);
	const least = Math.min(...candidates.map(({ value }) => value));
	const best = candidates.filter(({ value }) => value <= least + 1e-12);
	return best.length < candidates.length ? best.map(({ place }) => place) : [];
}

/** "3 gained, 1 lost" */
export const changeWords = (gained: number, lost: number): string =>
	gained + lost === 0
		? 'as today'
		: [gained ? `${counted(gained, 'region')} gained` : '', lost ? `${count(lost)} lost` : '']
				.filter(Boolean)
				.join(', ');
