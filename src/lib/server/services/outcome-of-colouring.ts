import {
	checkColouring,
	type ColouringProblem,
	type ColouringResult,
} from '../../engines/colouring/index.ts';
import { proofSentence } from './interim.ts';
import type { DeskColouring } from '../../schemas/desk.ts';
import type { DraftRow, NewColouring } from '../repositories/sheets.repository.ts';
import { explanationSentence } from './explanation-sentence.ts';

/** Thrown when a colouring does not pass the checker: never stored, never shown. */
export class CheckFailed extends Error {}

/** How a colouring is stored: the colouring itself, or why there is none. */
export interface Outcome {
	colouring: NewColouring | null;
	explanation: StoredExplanation | null;
}
export type StoredExplanation = Exclude<ColouringResult, { status: 'coloured' }>;

/** Has the result looked over by the checker, which shares no code with the engine, before it is kept. */
export function checkedOutcome(problem: ColouringProblem, result: ColouringResult): Outcome {
	const faults = checkColouring(problem, result);
	if (faults.length > 0) throw new CheckFailed(faults.join(' '));
	if (result.status !== 'coloured') return { colouring: null, explanation: result };
	const { colouring: inks, inksUsed, lowerBound, proof } = result;
	return { colouring: { inks, inksUsed, lowerBound, proof }, explanation: null };
}

/** What a stored draft says about its colouring, with the reason in one sentence. */
export function deskColouring(
	names: readonly string[],
	stored: Pick<DraftRow, 'inks' | 'inks_used' | 'lower_bound' | 'proof' | 'explanation'>,
): DeskColouring | null {
	const { inks, inks_used: inksUsed, lower_bound: lowerBound } = stored;
	if (inks && inksUsed !== null && lowerBound !== null) {
		const proof = stored.proof as unknown as DeskProof;
		return coloured(names, { inks, inksUsed, lowerBound, proof });
	}
	return stored.explanation
		? uncoloured(names, stored.explanation as unknown as StoredExplanation)
		: null;
}

type DeskProof = Extract<DeskColouring, { status: 'coloured' }>['proof'];

/** The same for an outcome that is about to be stored. */
export const deskOutcome = (names: readonly string[], outcome: Outcome): DeskColouring =>
	outcome.colouring
		? coloured(names, {
				...outcome.colouring,
				inks: Array.from(outcome.colouring.inks),
				proof: outcome.colouring.proof as DeskProof,
			})
		: uncoloured(names, outcome.explanation as StoredExplanation);

const coloured = (
	names: readonly string[],
	found: { inks: number[]; inksUsed: number; lowerBound: number; proof: DeskProof },
): DeskColouring => ({ status: 'coloured', ...found, sentence: proofSentence(found, names) });

const uncoloured = (names: readonly string[], found: StoredExplanation): DeskColouring =>
	found.status === 'undecided'
		? { ...found, sentence: found.message }
		: { ...found, sentence: explanationSentence(found.explanation, names) };
