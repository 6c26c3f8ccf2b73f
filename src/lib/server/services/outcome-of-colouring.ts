import {
	explanationSentence,
	proofSentence,
	type ColouringResult,
	type Explanation,
	type Proof,
} from '../../engines/colouring/index.ts';
import type { DeskColouring } from '../../schemas/desk.ts';
import type { CheckedColouring } from '../jobs/colour.work.ts';
import type { DraftRow, NewColouring } from '../repositories/sheets.repository.ts';

/** Thrown when a result does not pass its checker: never stored, never shown. */
export class CheckFailed extends Error {}

/** How a colouring is stored: the colouring itself, or why there is none. */
export interface Outcome {
	colouring: (NewColouring & { proof: Proof }) | null;
	explanation: StoredExplanation | null;
}
export type StoredExplanation = Exclude<ColouringResult, { status: 'coloured' }>;

/** What may be stored: a result in which its checker, which shares no code with the engine, found no fault. */
export function checkedOutcome({ result, faults }: CheckedColouring): Outcome {
	if (faults.length > 0) throw new CheckFailed(faults.join(' '));
	if (result.status !== 'coloured') return { colouring: null, explanation: result };
	const { colouring: inks, inksUsed, lowerBound, proof } = result;
	return { colouring: { inks, inksUsed, lowerBound, proof }, explanation: null };
}

/** What numbers stand for in sentences. */
export interface Names {
	regions: readonly string[];
	inks: readonly { name: string }[];
}

/** What a stored draft says about its colouring, with the reason in a sentence; null if it says nothing. */
export function deskColouring(
	names: Names,
	stored: Pick<DraftRow, 'inks' | 'inks_used' | 'lower_bound' | 'proof' | 'explanation'>,
): DeskColouring | null {
	const { inks, inks_used: inksUsed, lower_bound: lowerBound } = stored;
	if (inks && inksUsed !== null && lowerBound !== null) {
		const proof = stored.proof as unknown as Proof;
		return coloured(names, { inks, inksUsed, lowerBound, proof });
	}
	const { explanation } = stored;
	return explanation && uncoloured(names, explanation as unknown as StoredExplanation);
}

/** What is stored of a draft's colouring, as the engine answered it; null if nothing is. */
export function storedResult(
	stored: Pick<DraftRow, 'inks' | 'inks_used' | 'lower_bound' | 'proof' | 'explanation'>,
): ColouringResult | null {
	const { inks, inks_used: inksUsed, lower_bound: lowerBound, explanation } = stored;
	if (!inks || inksUsed === null || lowerBound === null) {
		return explanation as unknown as StoredExplanation | null;
	}
	const proof = stored.proof as unknown as Proof;
	return { status: 'coloured', colouring: Int32Array.from(inks), inksUsed, lowerBound, proof };
}

/** The same for an outcome that is about to be stored. */
export const deskOutcome = (names: Names, { colouring, explanation }: Outcome): DeskColouring =>
	colouring
		? coloured(names, { ...colouring, inks: Array.from(colouring.inks) })
		: uncoloured(names, explanation as StoredExplanation);

const coloured = (
	names: Names,
	found: { inks: number[]; inksUsed: number; lowerBound: number; proof: Proof },
): DeskColouring => {
	const result = { ...found, status: 'coloured', colouring: Int32Array.from(found.inks) } as const;
	const sentence = proofSentence(result, (region) => names.regions[region]);
	return { status: 'coloured', ...found, sentence };
};

const uncoloured = (names: Names, found: StoredExplanation): DeskColouring =>
	found.status === 'undecided'
		? { ...found, sentence: found.message }
		: { ...found, sentence: explanationInWords(names, found.explanation) };

export const explanationInWords = ({ regions, inks }: Names, explanation: Explanation): string =>
	explanationSentence(
		explanation,
		(region) => regions[region],
		(ink) => inks[ink]?.name || `ink ${ink + 1}`,
	);
