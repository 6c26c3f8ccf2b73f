/** Units, territories and rules -> pre-checks, plans with bounds, figures, and a checker of its own. */
export type {
	Impossible,
	Measure,
	Move,
	Plan,
	Proposed,
	Reason,
	RebalanceResult,
	Relief,
	Territory,
	TerritoryProblem,
	Undecided,
	Watch,
} from './problem.ts';
export { mayEndIn, slack, type Prepared } from './prepare.ts';
export { prepare } from './prepared.ts';
export { canLeave, contiguityScratch, type ContiguityScratch } from './contiguity.ts';
export { tornParts, type Torn } from './torn-parts.ts';
export { preCheck } from './pre-check.ts';
export { relieve } from './relieve.ts';
export { checkPlan } from './check-plan.ts';
export { ruleFaults } from './check-rules.ts';
export { checkWitness } from './check-witness.ts';
