import { planFrom } from './plan-of.ts';
import { preCheck } from './pre-check.ts';
import type { Prepared } from './prepare.ts';
import { prepare } from './prepared.ts';
import type { Plan, RebalanceResult, TerritoryProblem, Watch } from './problem.ts';
import { search } from './search.ts';
import { shortfall } from './shortfall.ts';

/**
 * Evens out territories: every measure within its tolerance of the targets, every territory in one
 * piece, all rules kept, and today disturbed as little as the goal allows; or why it cannot be done; or,
 * undecided, the plan that came nearest. The same problem gives the same answer.
 *
 * A plan proposed keeps every rule (`checkPlan` tells so by itself). `lowerBound` is never above the
 * cost of any plan that does; `proved` is said only where the bound meets the cost.
 * A cancelled run answers with the best so far.
 *
 * @throws RangeError for a programmer's error: see `validate`
 */
export async function rebalance(
	problem: TerritoryProblem,
	watch: Watch = {},
): Promise<RebalanceResult> {
	const prepared = prepare(problem);
	if ('status' in prepared) return prepared;
	watch.progress?.('Checking the rules', 0);
	const obstacle = preCheck(prepared);
	if (obstacle) return obstacle;
	const found = await search(prepared, stage(watch, 0.02, 0.75));
	const plan = found && planFrom(prepared, found.assignment);
	const lowerBound = 0;
	if (found?.sound && found.conflicts === 0 && plan) return proposed(prepared, plan, lowerBound);
	const keeps = found?.conflicts === 0 ? plan : null;
	return undecided(prepared, keeps, lowerBound, watch);
}

/** The part of the whole from `from` on that takes `share` of it. */
function stage(watch: Watch, from: number, share: number): Watch {
	return {
		...watch,
		progress: (step, part) => watch.progress?.(step, from + part * share),
	};
}

function proposed(prepared: Prepared, plan: Plan, bound: number): RebalanceResult {
	const lowerBound = Math.min(bound, plan.cost);
	const proved =
		prepared.problem.goal === 'fewest-moves' && lowerBound >= plan.cost - 1e-9 * (1 + plan.cost);
	return { status: 'proposed', ...plan, lowerBound, proved };
}

function undecided(
	prepared: Prepared,
	best: Plan | null,
	lowerBound: number,
	watch: Watch,
): RebalanceResult {
	const stopped = watch.cancelled?.() ? 'The run was stopped. ' : '';
	const message = best
		? shortfall(prepared, best)
		: 'No assignment in one piece that keeps the rules was found; whether there is one is open.';
	return { status: 'undecided', best, lowerBound, message: stopped + message };
}
