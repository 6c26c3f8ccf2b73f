import type { TerritoryProblem } from './problem.ts';
import { cutBorders } from './territory-graph.ts';
import { vectorAt } from './sphere.ts';
import type { UnitGeometry } from './unit-geometry.ts';

/** What figures need to know of a problem once, however often units move. */
export interface FigureContext {
	problem: TerritoryProblem;
	geometry: UnitGeometry | null;
	/** number of territories that do not close */
	staying: number;
	/** total of each measure */
	totals: number[];
	/** target of each measure and territory, NaN for those that close */
	targets: Float64Array[];
	/** target of a territory with capacity 1 */
	fullTargets: number[];
	/** load of today of each measure and territory */
	todayLoads: Float64Array[];
	/** units of each territory today, ascending; the last list is of those without one */
	todayUnits: number[][];
	cutToday: number;
	/** the middle of each unit, x y z; null without geometry */
	middles: Float64Array | null;
	/** stamps for walks within one territory */
	stamps: Uint32Array;
	stamp: number;
}

export function figureContext(
	problem: TerritoryProblem,
	geometry: UnitGeometry | null,
): FigureContext {
	const { graph, measures, territories, today } = problem;
	if (geometry && geometry.areaKm2.length !== graph.count) {
		throw new RangeError(`Geometry of ${geometry.areaKm2.length} units for ${graph.count}.`);
	}
	const totals = measures.map(({ values }) => values.reduce((sum, value) => sum + value, 0));
	const capacities = territories.reduce((sum, t) => sum + (t.closing ? 0 : t.capacity), 0);
	const fullTargets = totals.map((total) => total / capacities);
	return {
		problem,
		geometry,
		staying: territories.filter(({ closing }) => !closing).length,
		totals,
		fullTargets,
		targets: fullTargets.map((full) =>
			Float64Array.from(territories, (t) => (t.closing ? NaN : t.capacity * full)),
		),
		todayLoads: measures.map(({ values }) => {
			const loads = new Float64Array(territories.length);
			values.forEach((value, u) => today[u] >= 0 && (loads[today[u]] += value));
			return loads;
		}),
		todayUnits: membersOf(today, territories.length),
		cutToday: cutBorders(graph, today),
		middles: geometry && middlesOf(geometry.at),
		stamps: new Uint32Array(graph.count),
		stamp: 0,
	};
}

/** Units of each territory, ascending; one more list for those without (-1). */
export function membersOf(assignment: Int32Array, k: number): number[][] {
	const members: number[][] = Array.from({ length: k + 1 }, () => []);
	assignment.forEach((t, u) => members[t < 0 ? k : t].push(u));
	return members;
}

function middlesOf(at: Float64Array): Float64Array {
	const middles = new Float64Array((at.length / 2) * 3);
	for (let u = 0; u < at.length / 2; u++) vectorAt(at[2 * u], at[2 * u + 1], middles, 3 * u);
	return middles;
}
