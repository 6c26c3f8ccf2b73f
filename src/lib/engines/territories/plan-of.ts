import { planFrom } from './plan-from.ts';
import { prepare } from './prepared.ts';
import type { Impossible, Plan, TerritoryProblem } from './problem.ts';

/**
 * What follows from an assignment, as proposals state it; for plans found and those made by hand. Nothing
 * is judged here: `checkPlan` tells whether the rules are kept.
 *
 * @param assignment territory of every unit, never -1; copied
 * @returns Impossible where the problem itself cannot be prepared (a missing value, nobody stays)
 */
export function planOf(problem: TerritoryProblem, assignment: Int32Array): Plan | Impossible {
	const prepared = prepare(problem);
	return 'status' in prepared ? prepared : planFrom(prepared, assignment);
}
