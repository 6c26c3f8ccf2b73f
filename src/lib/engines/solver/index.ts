/** Budgeted search. Steps are conflicts, never milliseconds. */
export { Sat, type Answer, type Budget } from './sat.ts';
export { checkDrup } from './drup.ts';
export { minimumHittingSet, type HittingSet } from './integer.ts';
