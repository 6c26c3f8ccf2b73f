import type { ColouringProblem } from './problem.ts';

/** What a run may spend, in steps, so that the answer does not depend on the machine. */
export interface Effort {
	/** random chain exchanges at one impasse */
	walk: number;
	/** chain vertices visited: this many, and this many more for each region */
	chainSteps: number;
	chainStepsEach: number;
	/** steps of the clique and wheel searches */
	boundSteps: number;
	/** solver conflicts on one ball of regions, and on a whole map */
	ballConflicts: number;
	wholeConflicts: number;
	/** regions times inks that are still put to the solver at once */
	solverSize: number;
	/** regions in the largest ball */
	ballSize: number;
	/** moves of the improver for each region, and at least */
	movesEach: number;
}

const efforts: Record<NonNullable<ColouringProblem['effort']>, Effort> = {
	quick: {
		walk: 100,
		chainSteps: 200_000,
		chainStepsEach: 50,
		boundSteps: 2_000_000,
		ballConflicts: 5_000,
		wholeConflicts: 5_000,
		solverSize: 200_000,
		ballSize: 1_000,
		movesEach: 20,
	},
	normal: {
		walk: 200,
		chainSteps: 2_000_000,
		chainStepsEach: 400,
		boundSteps: 20_000_000,
		ballConflicts: 20_000,
		wholeConflicts: 50_000,
		solverSize: 2_000_000,
		ballSize: 10_000,
		movesEach: 100,
	},
	thorough: {
		walk: 1_000,
		chainSteps: 20_000_000,
		chainStepsEach: 4_000,
		boundSteps: 200_000_000,
		ballConflicts: 20_000,
		wholeConflicts: 1_000_000,
		solverSize: 10_000_000,
		ballSize: 100_000,
		movesEach: 500,
	},
};

/** With a factor, the steps of what may run out of them grow; sizes that limit memory stay. */
export function effortOf({ effort = 'normal', effortTimes = 1 }: ColouringProblem): Effort {
	const once = efforts[effort];
	return {
		...once,
		chainSteps: once.chainSteps * effortTimes,
		chainStepsEach: once.chainStepsEach * effortTimes,
		boundSteps: once.boundSteps * effortTimes,
		wholeConflicts: once.wholeConflicts * effortTimes,
	};
}

/** Solver conflicts that one question about the whole map may take. */
export const mostConflicts = (problem: ColouringProblem): number =>
	effortOf(problem).wholeConflicts;
