import type { FigureContext } from './figure-context.ts';
import type { MeasureSummary, PlanFigures, TerritoryFigures, UnitShare } from './figures-of.ts';
import { largestOf } from './territory-figures.ts';
import { counted } from './words.ts';

/** Figures over the whole plan, from those of its territories. Time grows with territories alone. */
export function wholeFigures(
	context: FigureContext,
	territories: TerritoryFigures[],
	/** units without a territory that have one today */
	dropped: readonly number[],
	unassigned: number,
	largestUnits: (UnitShare | null)[],
): PlanFigures {
	const { problem } = context;
	const staying = problem.territories.filter(({ closing }) => !closing).length;
	const units = problem.graph.count;
	const movedUnits = territories.reduce((sum, t) => sum + t.gainedUnits, dropped.length);
	const droppedCost = dropped.reduce((sum, u) => sum + (problem.cost ? problem.cost[u] : 1), 0);
	const perTerritory = units / staying;
	return {
		territories,
		measures: problem.measures.map((_, m) =>
			summary(context, m, territories, dropped, largestUnits[m], perTerritory),
		),
		unitsPerTerritory: perTerritory,
		movedUnits,
		movedShare: units > 0 ? movedUnits / units : 0,
		movedCost: territories.reduce((sum, t) => sum + t.gainedCost, droppedCost),
		unassigned,
		cutBorders: {
			before: context.cutToday,
			after: territories.reduce((sum, t) => sum + t.cutBorders, 0) / 2,
		},
		torn: territories.flatMap(({ torn }, t) => (torn ? [t] : [])),
	};
}

function summary(
	{ problem, totals }: FigureContext,
	m: number,
	territories: TerritoryFigures[],
	dropped: readonly number[],
	largestUnit: UnitShare | null,
	perTerritory: number,
): MeasureSummary {
	const { values, name, tolerance } = problem.measures[m];
	const largest = { territory: -1, deviation: NaN };
	const outside: number[] = [];
	let [sum, measured, moved] = [0, 0, 0];
	territories.forEach(({ measures }, t) => {
		const { deviation, gained, outside: isOutside } = measures[m];
		moved += gained;
		if (isOutside) outside.push(t);
		if (Number.isNaN(deviation)) return;
		sum += Math.abs(deviation);
		measured++;
		if (largest.territory < 0 || Math.abs(deviation) > Math.abs(largest.deviation)) {
			Object.assign(largest, { territory: t, deviation });
		}
	});
	for (const u of dropped) moved += values[u];
	return {
		largest,
		mean: measured > 0 ? sum / measured : NaN,
		outside,
		moved,
		movedShare: totals[m] > 0 ? moved / totals[m] : 0,
		largestUnit,
		hard: tolerance === null ? null : hardTolerance(name, tolerance, perTerritory, largestUnit),
	};
}

/** The heaviest unit of each measure against the target of a full capacity. */
export function largestUnits({ problem, fullTargets }: FigureContext): (UnitShare | null)[] {
	return problem.measures.map(({ values }, m) => largestOf(values, values.keys(), fullTargets[m]));
}

/**
 * A sentence when a tolerance is hard to meet for the size of the units, else null: below two mean units
 * to either side (a rule of thumb from trials of our own: 31 units a territory met 10 % with ease and 5 %
 * barely), or below the heaviest unit.
 */
export function hardTolerance(
	name: string,
	tolerance: number,
	perTerritory: number,
	largest: UnitShare | null,
): string | null {
	const percent = (share: number) => `${Number((100 * share).toFixed(1))} %`;
	const few = tolerance * perTerritory < 2;
	const heavy = largest !== null && largest.share > tolerance;
	if (!few && !heavy) return null;
	const mean = counted(Math.round(10 * perTerritory) / 10, 'unit', 'units');
	const size = few ? [`a territory has ${mean} on average, each ${percent(1 / perTerritory)}`] : [];
	const most = heavy ? [`#${largest.unit} alone is ${percent(largest.share)}`] : [];
	return `A tolerance of ${percent(tolerance)} for ${name} is hard to meet: ${[...size, ...most].join(', and ')} of a target.`;
}
