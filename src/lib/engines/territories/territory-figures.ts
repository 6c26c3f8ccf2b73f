import type { FigureContext } from './figure-context.ts';
import type { MeasureFigures, TerritoryFigures, UnitShare } from './figures-of.ts';
import { slack } from './prepare.ts';
import { middleOf, shapeOf, travelOf } from './shape.ts';

/** All figures of territory `t` with these units (ascending). Time grows with its units alone. */
export function territoryFigures(
	context: FigureContext,
	t: number,
	units: readonly number[],
	assignment: Int32Array,
): TerritoryFigures {
	const { problem, geometry } = context;
	const { base, closing } = problem.territories[t];
	const kept = units.filter((u) => problem.today[u] === t);
	const gained = units.filter((u) => problem.today[u] !== t);
	const lost = context.todayUnits[t].filter((u) => assignment[u] !== t);
	const changes = { units, kept, gained, lost };
	const areaKm2 = geometry ? units.reduce((sum, u) => sum + geometry.areaKm2[u], 0) : 0;
	const middle = middleOf(context, units);
	const isHome = base >= 0 && assignment[base] === t;
	const drawn = geometry && units.length > 0 ? geometry : null;
	return {
		units: units.length,
		keptUnits: kept.length,
		gainedUnits: gained.length,
		lostUnits: lost.length,
		measures: problem.measures.map((_, m) => measureFigures(context, m, t, changes)),
		gainedCost: gained.reduce((sum, u) => sum + (problem.cost ? problem.cost[u] : 1), 0),
		cutBorders: cutOf(context, t, units, assignment),
		torn: (base >= 0 && !closing && !isHome) || !isWhole(context, t, units, assignment),
		areaKm2,
		travel: drawn && travelOf(drawn, units, isHome ? base : -1, areaKm2, middle),
		shape: drawn && shapeOf(drawn, units, assignment, areaKm2, middle),
	};
}

interface Changes {
	units: readonly number[];
	kept: number[];
	gained: number[];
	lost: number[];
}

function measureFigures(
	context: FigureContext,
	m: number,
	t: number,
	{ units, kept, gained, lost }: Changes,
): MeasureFigures {
	const { values, tolerance } = context.problem.measures[m];
	const target = context.targets[m][t];
	const sum = (of: readonly number[]) => of.reduce((all, u) => all + values[u], 0);
	const load = sum(units);
	const before = context.todayLoads[m][t];
	const against = (value: number) => ({
		load: value,
		index: target > 0 ? (100 * value) / target : NaN,
		deviation: target > 0 ? (value - target) / target : NaN,
	});
	const now = against(load);
	return {
		...now,
		target,
		today: against(before),
		kept: sum(kept),
		gained: sum(gained),
		lost: sum(lost),
		largestGained: largestOf(values, gained, target),
		largestUnit: largestOf(values, units, target),
		outside: tolerance !== null && Math.abs(now.deviation) > tolerance + slack,
	};
}

/** The unit with the largest value, the first of equals. */
export function largestOf(
	values: Float64Array,
	units: Iterable<number>,
	target: number,
): UnitShare | null {
	let unit = -1;
	for (const u of units) if (unit < 0 || values[u] > values[unit]) unit = u;
	if (unit < 0) return null;
	return { unit, value: values[unit], share: target > 0 ? values[unit] / target : NaN };
}

function cutOf(
	{ problem: { graph } }: FigureContext,
	t: number,
	units: readonly number[],
	assignment: Int32Array,
): number {
	let cut = 0;
	for (const u of units) {
		for (let i = graph.offsets[u]; i < graph.offsets[u + 1]; i++) {
			const other = assignment[graph.targets[i]];
			if (other >= 0 && other !== t) cut++;
		}
	}
	return cut;
}

function isWhole(
	context: FigureContext,
	t: number,
	units: readonly number[],
	assignment: Int32Array,
): boolean {
	if (units.length < 2) return true;
	const { offsets, targets } = context.problem.graph;
	const { stamps } = context;
	if (++context.stamp > 0xffffffff) {
		stamps.fill(0);
		context.stamp = 1;
	}
	const reached = [units[0]];
	stamps[units[0]] = context.stamp;
	for (let head = 0; head < reached.length; head++) {
		for (let i = offsets[reached[head]]; i < offsets[reached[head] + 1]; i++) {
			const w = targets[i];
			if (assignment[w] !== t || stamps[w] === context.stamp) continue;
			stamps[w] = context.stamp;
			reached.push(w);
		}
	}
	return reached.length === units.length;
}
