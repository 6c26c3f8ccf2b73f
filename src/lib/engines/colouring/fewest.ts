import type { Proof } from './problem.ts';

/** What one number of inks was found to do. `proof` is on vertices and may be missing. */
export type Attempt =
	| { status: 'coloured'; ink: Int32Array }
	| { status: 'refuted'; proof: Proof | null }
	| { status: 'unknown' };

export interface FewestOutcome {
	inks: number;
	ink: Int32Array;
	lowerBound: number;
	/** shows the lower bound; null when it is the bound given or was found without a certificate */
	proof: Proof | null;
}

/**
 * The fewest inks from `lowest` on: quick tries upwards until one succeeds, then exact answers
 * downwards from there; where one stays open, exact answers upwards to raise the bound. Null when no
 * number up to `highest` succeeds.
 */
export function fewestInks(
	lowest: number,
	highest: number,
	quick: (inks: number) => Int32Array | null,
	exact: (inks: number) => Attempt,
): FewestOutcome | null {
	let best: FewestOutcome | null = null;
	for (let inks = lowest; inks <= highest && !best; inks++) {
		const ink = quick(inks);
		if (ink) best = { inks, ink, lowerBound: lowest, proof: null };
	}
	if (!best) return null;
	while (best.inks > best.lowerBound) {
		const answer = exact(best.inks - 1);
		if (answer.status === 'coloured') best = { ...best, inks: best.inks - 1, ink: answer.ink };
		else if (answer.status === 'refuted') raise(best, best.inks, answer.proof);
		else break;
	}
	while (best.inks - 1 > best.lowerBound) {
		const answer = exact(best.lowerBound);
		if (answer.status !== 'refuted') break;
		raise(best, best.lowerBound + 1, answer.proof);
	}
	return best;
}

function raise(best: FewestOutcome, lowerBound: number, proof: Proof | null): void {
	best.lowerBound = lowerBound;
	best.proof = proof;
}
