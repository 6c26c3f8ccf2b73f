import {
	checkColouring,
	checkExplanation,
	colour,
	type ColouringProblem,
	type ColouringResult,
} from '../../engines/colouring/index.ts';
import type { Task } from './task-port.ts';

export interface CheckedColouring {
	result: ColouringResult;
	/** what the checker found wrong, in words; empty when the result holds */
	faults: string[];
}

/** Colours a region graph and has the checker look at the result. */
export async function colourGraph({ input }: Task<ColouringProblem>): Promise<CheckedColouring> {
	const result = await colour(input);
	return { result, faults: await faultsIn(input, result) };
}

/** Has the checker look at a colouring that is stored. */
export const recheck = ({
	input,
}: Task<{ problem: ColouringProblem; result: ColouringResult }>): Promise<string[]> =>
	faultsIn(input.problem, input.result);

export const faultsIn = async (
	problem: ColouringProblem,
	result: ColouringResult,
): Promise<string[]> =>
	result.status === 'impossible'
		? checkExplanation(problem, result.explanation)
		: checkColouring(problem, result);
