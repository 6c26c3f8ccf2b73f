import { lowerBound } from './lower-bound.ts';
import { planFrom } from './plan-from.ts';
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
	const found = await search(prepared, stage(watch, 0.02, 0.7));
	const plan = found && found.conflicts === 0 ? planFrom(prepared, found.assignment) : null;
	const rest = stage(watch, 0.72, 0.28);
	if (plan && found?.sound) return proposed(prepared, plan, rest);
	return undecided(prepared, plan, rest);
}

/** The part of the whole from `from` on that takes `share` of it. */
function stage(watch: Watch, from: number, share: number): Watch {
	return {
		...watch,
		progress: (step, part) => watch.progress?.(step, from + part * share),
	};
}

async function proposed(prepared: Prepared, plan: Plan, watch: Watch): Promise<RebalanceResult> {
	const { value } = await lowerBound(prepared, { incumbentCost: plan.cost, watch });
	const bound = Math.min(value, plan.cost);
	const meets = bound >= plan.cost - 1e-9 * (1 + plan.cost);
	const proved = meets && prepared.problem.goal === 'fewest-moves';
	return { status: 'proposed', ...plan, lowerBound: bound, proved };
}

async function undecided(
	prepared: Prepared,
	best: Plan | null,
	watch: Watch,
): Promise<RebalanceResult> {
	const { value } = await lowerBound(prepared, { watch });
	const stopped = watch.cancelled?.() ? 'The run was stopped. ' : '';
	const message = best
		? shortfall(prepared, best)
		: 'No assignment in one piece that keeps the rules was found; whether there is one is open.';
	return { status: 'undecided', best, lowerBound: value, message: stopped + message };
}
