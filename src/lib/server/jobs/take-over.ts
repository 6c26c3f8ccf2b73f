import {
	checkColouring,
	type ColouringProblem,
	type ColouringResult,
} from '../../engines/colouring/index.ts';

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

/**
 * A result with the inks of somebody's own arrangement in place of those it was found with, keeping what it
 * says of the least number; null where the arrangement breaks a rule, leaves out a region or needs more
 * inks. The separate checker is asked, so the sender is trusted with nothing.
 */
export function takeOver(
	problem: ColouringProblem,
	found: ColouringResult,
	shown: readonly number[],
): Coloured | null {
	if (found.status === 'impossible' || shown.length !== problem.regions) return null;
	const used = shown.reduce((most, ink) => Math.max(most, ink + 1), 0);
	if (used > mostInks(problem, found)) return null;
	const arranged: Coloured = {
		...boundOf(found, used),
		status: 'coloured',
		colouring: Int32Array.from(shown),
	};
	return checkColouring(problem, arranged).length === 0 ? arranged : null;
}

const mostInks = ({ inks }: ColouringProblem, found: ColouringResult): number => {
	if (inks !== 'fewest') return inks;
	return found.status === 'coloured' ? found.inksUsed : 0;
};

/** A proof is about one number of inks: an arrangement with another number stands without it. */
function boundOf(found: Exclude<ColouringResult, { status: 'impossible' }>, used: number) {
	if (found.status === 'coloured' && found.inksUsed === used) {
		const { inksUsed, lowerBound, proof } = found;
		return { inksUsed, lowerBound, proof };
	}
	return {
		inksUsed: used,
		lowerBound: Math.min(found.lowerBound, used),
		proof: { kind: 'not-proved' as const, regions: [] },
	};
}
