import {
	checkPlan,
	checkWitness,
	planOf,
	rebalance,
	ruleFaults,
	type Impossible,
	type Plan,
	type RebalanceResult,
	type TerritoryProblem,
} from '../../engines/territories/index.ts';
import {
	problemOfDraft,
	type TerritoryGround,
} from '../../engines/territories/problem-of-draft.ts';
import type { TerritoryDraft, Wishes } from '../../engines/territories/territory-draft.ts';
import { teller, type Task } from './task-port.ts';

/** A draft, what it stands on, and what is wished; making the problem of it is work for the thread as well. */
export interface RebalanceInput {
	ground: TerritoryGround;
	draft: TerritoryDraft;
	wishes: Wishes;
}

/** A plan as it is stored: plain lists, and what the checker says of it. */
export interface MadePlan {
	assignment: number[];
	moved: number;
	/** regions by number whose move is compulsory */
	compulsory: number[];
	cost: number;
	compulsoryCost: number;
	/** null for a territory that closes */
	deviations: (number | null)[][];
	cutBorders: { before: number; after: number };
	/** rules that it breaks, in the engine's words */
	faults: string[];
	/** tolerances that it misses */
	misses: string[];
}

export type RebalanceOutcome =
	| { status: 'proposed'; plan: MadePlan; lowerBound: number; proved: boolean }
	| { status: 'undecided'; plan: MadePlan | null; lowerBound: number; message: string }
	| Impossible;

/** An outcome, or what the checker found wrong with it: such a one is never stored. */
export type CheckedRebalance = { outcome: RebalanceOutcome } | { faults: string[] };

/** Works out a plan and has the checker, which shares no code with the engine, look at it. */
export async function rebalancePlan({
	input,
	port,
}: Task<RebalanceInput>): Promise<CheckedRebalance> {
	const problem = problemOfDraft(input.ground, input.draft, input.wishes);
	const result = await rebalance(problem, { progress: teller(port) });
	const faults = faultsOf(problem, result);
	return faults.length > 0 ? { faults } : { outcome: outcomeOf(problem, result) };
}

/** What is wrong with an answer of the engine, in its words; empty when it holds. */
export function faultsOf(problem: TerritoryProblem, result: RebalanceResult): string[] {
	if (result.status === 'impossible') return checkWitness(problem, result);
	if (result.status === 'proposed') return checkPlan(problem, result);
	return result.best ? checkPlan(problem, result.best, { tolerances: false }) : [];
}

function outcomeOf(problem: TerritoryProblem, result: RebalanceResult): RebalanceOutcome {
	if (result.status === 'impossible') return result;
	const { lowerBound } = result;
	if (result.status === 'proposed') {
		const { status, proved } = result;
		return { status, plan: madePlan(problem, result), lowerBound, proved };
	}
	const { status, message, best } = result;
	return { status, plan: best && madePlan(problem, best), lowerBound, message };
}

/** Figures and faults of a plan that somebody changed by hand, or why the problem itself has none. */
export function judgePlan({
	input: { ground, draft, wishes, assignment },
}: Task<RebalanceInput & { assignment: Int32Array }>): { plan: MadePlan } | Impossible {
	const problem = problemOfDraft(ground, draft, wishes);
	const plan = planOf(problem, assignment);
	return 'status' in plan ? plan : { plan: madePlan(problem, plan) };
}

function madePlan(problem: TerritoryProblem, plan: Plan): MadePlan {
	const { assignment, moves, cost, compulsoryCost, deviations, cutBorders } = plan;
	const faults = ruleFaults(problem, assignment, { tolerances: false });
	const all = ruleFaults(problem, assignment);
	return {
		assignment: Array.from(assignment),
		moved: moves.length,
		compulsory: moves.flatMap(({ unit, compulsory }) => (compulsory ? [unit] : [])),
		...{ cost, compulsoryCost, cutBorders, faults },
		deviations: deviations.map((column) =>
			Array.from(column, (deviation) => (Number.isFinite(deviation) ? deviation : null)),
		),
		misses: all.filter((fault) => !faults.includes(fault)),
	};
}
