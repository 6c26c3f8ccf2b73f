import {
	checkColouring,
	type ColouringProblem,
	type ColouringResult,
} from '../../engines/colouring/index.ts';

/**
 * A result with the proof that an earlier one had, where it has none itself and that proof still holds: what
 * was proved by a long search is not forgotten with a change that leaves it standing.
 */
export function keepProof(
	problem: ColouringProblem,
	found: ColouringResult,
	earlier: ColouringResult | null,
): ColouringResult {
	if (found.status !== 'coloured' || earlier?.status !== 'coloured') return found;
	const open = found.proof.kind === 'not-proved' && earlier.proof.kind !== 'not-proved';
	if (!open || found.inksUsed !== earlier.inksUsed || problem.inks !== 'fewest') return found;
	const proved = { ...found, lowerBound: found.inksUsed, proof: earlier.proof };
	return checkColouring(problem, proved).length === 0 ? proved : found;
}
