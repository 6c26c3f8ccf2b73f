import type { FigureContext } from './figure-context.ts';
import type { MeasureSummary, PlanFigures, TerritoryFigures, UnitShare } from './figures-of.ts';
import { largestOf } from './territory-figures.ts';
import { counted as countedWords } from './words.ts';

/** What sums and extremes over the plan need of each territory, in flat arrays: fast to walk. */
export interface Tally {
	/** `m * territories + t` */
	deviation: Float64Array;
	gained: Float64Array;
	outside: Uint8Array;
	/** by territory */
	gainedUnits: Uint32Array;
	gainedCost: Float64Array;
	cut: Uint32Array;
	torn: Uint8Array;
}

export function newTally(measures: number, k: number): Tally {
	return {
		deviation: new Float64Array(measures * k),
		gained: new Float64Array(measures * k),
		outside: new Uint8Array(measures * k),
		gainedUnits: new Uint32Array(k),
		gainedCost: new Float64Array(k),
		cut: new Uint32Array(k),
		torn: new Uint8Array(k),
	};
}

/** Notes the figures of one territory. */
export function tallyUp(tally: Tally, t: number, of: TerritoryFigures): void {
	of.measures.forEach(({ deviation, gained, outside }, m) => {
		const at = m * tally.cut.length + t;
		tally.deviation[at] = deviation;
		tally.gained[at] = gained;
		tally.outside[at] = outside ? 1 : 0;
	});
	tally.gainedUnits[t] = of.gainedUnits;
	tally.gainedCost[t] = of.gainedCost;
	tally.cut[t] = of.cutBorders;
	tally.torn[t] = of.torn ? 1 : 0;
}

/** Figures over the whole plan. Time grows with territories alone. `without`: units without territory. */
export function wholeFigures(
	context: FigureContext,
	tally: Tally,
	without: readonly number[],
	largestUnits: (UnitShare | null)[],
): Omit<PlanFigures, 'territories'> {
	const { problem } = context;
	const dropped = without.filter((u) => problem.today[u] >= 0);
	const units = problem.graph.count;
	const movedUnits = sum(tally.gainedUnits) + dropped.length;
	const droppedCost = dropped.reduce((all, u) => all + (problem.cost ? problem.cost[u] : 1), 0);
	const unitsPerTerritory = units / context.staying;
	return {
		measures: problem.measures.map((_, m) => {
			const { name, tolerance } = problem.measures[m];
			const largestUnit = largestUnits[m];
			const hard =
				tolerance === null ? null : hardTolerance(name, tolerance, unitsPerTerritory, largestUnit);
			return { ...summary(context, m, tally, dropped), largestUnit, hard };
		}),
		unitsPerTerritory,
		movedUnits,
		movedShare: units > 0 ? movedUnits / units : 0,
		movedCost: sum(tally.gainedCost) + droppedCost,
		unassigned: without.length,
		cutBorders: { before: context.cutToday, after: sum(tally.cut) / 2 },
		torn: marked(tally.torn),
	};
}

function sum(values: Float64Array | Uint32Array): number {
	let total = 0;
	for (let i = 0; i < values.length; i++) total += values[i];
	return total;
}

function marked(marks: Uint8Array): number[] {
	const places: number[] = [];
	for (let t = 0; t < marks.length; t++) if (marks[t]) places.push(t);
	return places;
}

function summary(
	{ problem, totals }: FigureContext,
	m: number,
	tally: Tally,
	dropped: readonly number[],
): Omit<MeasureSummary, 'largestUnit' | 'hard'> {
	const k = tally.cut.length;
	const deviation = tally.deviation.subarray(m * k, m * k + k);
	const { values } = problem.measures[m];
	let [sizes, counted, territory] = [0, 0, -1];
	for (let t = 0; t < k; t++) {
		const size = Math.abs(deviation[t]);
		if (Number.isNaN(size)) continue;
		sizes += size;
		counted++;
		if (territory < 0 || size > Math.abs(deviation[territory])) territory = t;
	}
	const moved =
		sum(tally.gained.subarray(m * k, m * k + k)) + dropped.reduce((all, u) => all + values[u], 0);
	return {
		largest: { territory, deviation: territory < 0 ? NaN : deviation[territory] },
		mean: counted > 0 ? sizes / counted : NaN,
		outside: marked(tally.outside.subarray(m * k, m * k + k)),
		moved,
		movedShare: totals[m] > 0 ? moved / totals[m] : 0,
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
	const mean = countedWords(Math.round(10 * perTerritory) / 10, 'unit', 'units');
	const size = few ? [`a territory has ${mean} on average, each ${percent(1 / perTerritory)}`] : [];
	const most = heavy ? [`#${largest.unit} alone is ${percent(largest.share)}`] : [];
	return `A tolerance of ${percent(tolerance)} for ${name} is hard to meet: ${[...size, ...most].join(', and ')} of a target.`;
}
