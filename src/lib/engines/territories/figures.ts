import { Board } from './board.ts';
import type { PlanFigures } from './figures-of.ts';
import type { TerritoryProblem } from './problem.ts';
import type { UnitGeometry } from './unit-geometry.ts';

/**
 * Every figure the planner sees of an assignment (-1 for units without a territory): by territory
 * loads, indices (100 is the target), what was kept, gained and lost against today, travel and shape; over
 * the whole deviations, moves and cut borders. `figures(problem, problem.today, geometry)` are those of
 * today. Measures must have finite values.
 * @throws RangeError when lengths differ
 */
export function figures(
	problem: TerritoryProblem,
	assignment: Int32Array,
	geometry: UnitGeometry | null,
): PlanFigures {
	return new Board(problem, assignment, geometry).figures();
}
