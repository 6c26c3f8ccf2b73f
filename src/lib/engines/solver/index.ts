/** Budgeted search. Steps are conflicts, nodes or iterations, never milliseconds. */
export { Sat, type Answer, type Budget } from './sat.ts';
export { checkDrup, type Replayed, type ReplayLimits } from './drup.ts';
export { minimumHittingSet, type HittingSet } from './integer.ts';
export { ProgramBuilder, type Program } from './program-builder.ts';
export { solveProgram, type ProgramLimits, type ProgramOutcome } from './program.ts';
export { boundFromPrices, provesInfeasible } from './program-certificates.ts';
