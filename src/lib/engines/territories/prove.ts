import { boundTerms } from './bound-terms.ts';
import { exactLimits, isSmall } from './exact-size.ts';
import { solveExact } from './exact.ts';
import { explainSmall } from './no-plan.ts';
import type { Prepared } from './prepare.ts';
import type { Impossible, Watch } from './problem.ts';

export interface KnownPlan {
	assignment: Int32Array;
	/** of every move, compulsory ones too */
	cost: number;
}

export interface ProvedPlan extends KnownPlan {
	/** no plan that keeps the rules costs less */
	lowerBound: number;
	/** the cost is the least possible (to a millionth, where costs are no whole numbers) */
	proved: boolean;
}

/**
 * Settles a small problem exactly: that `plan`, which keeps the rules, is the cheapest, or a cheaper one;
 * without a plan, a cheapest one or that there is none. Asks for a plan that costs less than the one
 * known: that none exists proves it. Budgets follow the effort.
 *
 * Expects rules that do not contradict each other (preCheck). The cost of moves is what is settled,
 * whatever the goal.
 * @returns null when the problem is too large or a budget ended the search with nothing to tell
 */
export async function proveOrImprove(
	prepared: Prepared,
	plan: KnownPlan | null,
	watch: Watch = {},
): Promise<ProvedPlan | { impossible: Impossible } | null> {
	if (!isSmall(prepared)) return null;
	watch.progress?.('Proving', 0);
	const { step, certainCost } = boundTerms(prepared);
	const limits = exactLimits(prepared, watch);
	const saving = plan && (step > 0 ? step : 1e-6 * Math.max(1, plan.cost));
	if (plan && plan.cost - certainCost < (saving ?? 0) / 2) {
		return { ...plan, lowerBound: plan.cost, proved: true };
	}
	const costAtMost = plan && saving ? plan.cost - saving : undefined;
	const outcome = await solveExact(prepared, { least: 'moves', costAtMost }, limits);
	if (outcome.status === 'infeasible') {
		if (plan) return { ...plan, lowerBound: plan.cost, proved: true };
		return { impossible: await explainSmall(prepared, null, outcome.deadEnd, watch) };
	}
	if (outcome.status === 'optimal') {
		const cost = costOf(prepared, outcome.assignment);
		return { assignment: outcome.assignment, cost, lowerBound: cost, proved: true };
	}
	const better = outcome.assignment
		? { assignment: outcome.assignment, cost: costOf(prepared, outcome.assignment) }
		: plan;
	if (!better) return null;
	const lowerBound = Math.max(certainCost, Math.min(better.cost, outcome.bound));
	return { ...better, lowerBound, proved: false };
}

function costOf({ problem, cost }: Prepared, assignment: Int32Array): number {
	let sum = 0;
	assignment.forEach((to, unit) => {
		if (problem.today[unit] !== to) sum += cost[unit];
	});
	return sum;
}
