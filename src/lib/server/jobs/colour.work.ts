import {
	checkColouring,
	checkExplanation,
	colour,
	type ColouringProblem,
	type ColouringResult,
} from '../../engines/colouring/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import type { BorderList } from '../../engines/borders/index.ts';
import { problemOf } from '../services/draft-problem.ts';
import { Unfit } from '../services/outcomes.ts';
import { keepProof } from './keep-proof.ts';
import { takeOver } from './take-over.ts';
import type { Task } from './task-port.ts';

/** A draft and what it stands on; making the problem of it is work for the thread as well. */
export interface DraftInput {
	keys: string[];
	borders: BorderList;
	draft: Draft;
}

export interface CheckedColouring {
	result: ColouringResult;
	/** what the checker found wrong, in words; empty when the result holds */
	faults: string[];
}

/** A draft that names what is not there cannot be coloured; told as data, because errors lose their kind on the way. */
export interface UnfitDraft {
	code: string;
	message: string;
	details?: Record<string, unknown>;
}

export interface ColourDraftInput extends DraftInput {
	/** inks to stay near to */
	previous: number[] | null;
	/** inks that the draft's sender shows: taken over if they hold */
	shown?: number[];
	/** what the draft before was coloured with: its proof is kept while it holds */
	earlier?: ColouringResult | null;
}

/** Colours a draft, near to the colouring before, and has the checker look at the result. */
export async function colourDraft({
	input: { previous, shown, earlier = null, ...input },
}: Task<ColourDraftInput>): Promise<
	(CheckedColouring & { arranged: boolean }) | { unfit: UnfitDraft }
> {
	try {
		const problem = problemOf(input, input.draft, previous);
		const { result, faults } = await colourAndCheck(problem);
		if (faults.length > 0) return { result, faults, arranged: false };
		const found = keepProof(problem, result, earlier);
		const taken = shown && takeOver(problem, found, shown);
		return { result: taken ?? found, faults, arranged: Boolean(taken) };
	} catch (problem) {
		if (!(problem instanceof Unfit)) throw problem;
		const { code, message, details } = problem;
		return { unfit: { code, message, details } };
	}
}

/** What is known of a draft with the inks that its sender shows; null if they do not hold. */
export const arrangeDraft = async ({
	input: { result, shown, ...input },
}: Task<DraftInput & { result: ColouringResult; shown: number[] }>) =>
	takeOver(problemOf(input, input.draft), result, shown);

/** Has the checker look at a colouring that is stored. */
export const recheck = ({
	input: { result, ...input },
}: Task<DraftInput & { result: ColouringResult }>): Promise<string[]> =>
	faultsIn(problemOf(input, input.draft), result);

export async function colourAndCheck(problem: ColouringProblem): Promise<CheckedColouring> {
	const result = await colour(problem);
	return { result, faults: await faultsIn(problem, result) };
}

export const faultsIn = async (
	problem: ColouringProblem,
	result: ColouringResult,
): Promise<string[]> =>
	result.status === 'impossible'
		? checkExplanation(problem, result.explanation)
		: checkColouring(problem, result);
