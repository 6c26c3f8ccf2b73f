import { lowerBound } from './lower-bound.ts';
import { noPlan } from './no-plan.ts';
import { planFrom } from './plan-from.ts';
import { preCheck } from './pre-check.ts';
import type { Prepared } from './prepare.ts';
import { prepare } from './prepared.ts';
import type { Plan, RebalanceResult, TerritoryProblem, Watch } from './problem.ts';
import { proveOrImprove } from './prove.ts';
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
	return plan && found?.sound ? settle(prepared, plan, rest) : unsettled(prepared, plan, rest);
}

/** The part of the whole from `from` on that takes `share` of it. */
function stage(watch: Watch, from: number, share: number): Watch {
	return {
		...watch,
		progress: (step, part) => watch.progress?.(step, from + part * share),
	};
}

/** A plan within tolerance: proved or bettered where the problem is small, else bounded. */
async function settle(prepared: Prepared, plan: Plan, watch: Watch): Promise<RebalanceResult> {
	const fewest = prepared.problem.goal === 'fewest-moves';
	const settled =
		fewest && !watch.cancelled?.() ? await proveOrImprove(prepared, plan, watch) : null;
	const exact = settled && 'assignment' in settled ? settled : null;
	const best = exact && exact.cost < plan.cost ? planFrom(prepared, exact.assignment) : plan;
	if (exact?.proved) return proposed(prepared, best, exact.lowerBound);
	const { value } = await lowerBound(prepared, { incumbentCost: best.cost, watch });
	return proposed(prepared, best, Math.max(value, exact?.lowerBound ?? 0));
}

function proposed(prepared: Prepared, plan: Plan, bound: number): RebalanceResult {
	const lowerBound = Math.min(bound, plan.cost);
	const meets = lowerBound >= plan.cost - 1e-9 * (1 + plan.cost);
	const proved = meets && prepared.problem.goal === 'fewest-moves';
	return { status: 'proposed', ...plan, lowerBound, proved };
}

/** No plan within tolerance was met: small problems are settled exactly, others shown impossible if so. */
async function unsettled(
	prepared: Prepared,
	best: Plan | null,
	watch: Watch,
): Promise<RebalanceResult> {
	if (!watch.cancelled?.()) {
		const settled = await proveOrImprove(prepared, null, stage(watch, 0, 0.5));
		if (settled && 'impossible' in settled) return settled.impossible;
		if (settled) {
			return proposed(prepared, planFrom(prepared, settled.assignment), settled.lowerBound);
		}
		const none = await noPlan(prepared, best?.assignment ?? null, stage(watch, 0.5, 0.3));
		if (none) return none;
	}
	const { value } = await lowerBound(prepared, { watch: stage(watch, 0.8, 0.2) });
	const stopped = watch.cancelled?.() ? 'The run was stopped. ' : '';
	const message = best
		? shortfall(prepared, best)
		: 'No assignment in one piece that keeps the rules was found; whether there is one is open.';
	return { status: 'undecided', best, lowerBound: value, message: stopped + message };
}
