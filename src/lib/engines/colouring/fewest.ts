/** What one number of inks was found to do. */
export type Attempt =
	{ status: 'coloured'; ink: Int32Array } | { status: 'refuted' } | { status: 'unknown' };

export interface FewestOutcome {
	inks: number;
	ink: Int32Array;
	lowerBound: number;
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
		if (ink) best = { inks, ink, lowerBound: lowest };
	}
	if (!best) return null;
	while (best.inks > best.lowerBound) {
		const answer = exact(best.inks - 1);
		if (answer.status === 'coloured') best = { ...best, inks: best.inks - 1, ink: answer.ink };
		else if (answer.status === 'refuted') best.lowerBound = best.inks;
		else break;
	}
	while (best.inks - 1 > best.lowerBound) {
		const answer = exact(best.lowerBound);
		if (answer.status !== 'refuted') break;
		best.lowerBound++;
	}
	return best;
}
