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
export { planFrom } from './plan-from.ts';
export { cutBorders, territoryGraph, type TerritoryPairs } from './territory-graph.ts';
export { unitGeometry } from './coverage-geometry.ts';
export { geometryFrom, type GeometryParts, type UnitGeometry } from './unit-geometry.ts';
export { figures } from './figures.ts';
export type {
	MeasureFigures,
	MeasureSummary,
	PlanFigures,
	Shape,
	TerritoryFigures,
	Travel,
	UnitShare,
} from './figures-of.ts';
export { Board } from './board.ts';
export { hardTolerance } from './whole-figures.ts';
export { rebalance } from './rebalance.ts';
export { planOf } from './plan-of.ts';
export { fromScratch, type ScratchProblem } from './from-scratch.ts';
export { lowerBound, type LowerBound } from './lower-bound.ts';
export { noPlan } from './no-plan.ts';
export { proveOrImprove, type KnownPlan, type ProvedPlan } from './prove.ts';
export { reassign } from './reassign.ts';
export { carryTerritories, type CarriedTerritories } from './carry-territories.ts';
