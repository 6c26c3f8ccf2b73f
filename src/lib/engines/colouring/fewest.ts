/** What one number of inks was found to do. */
export type Attempt =
	{ status: 'coloured'; ink: Int32Array } | { status: 'refuted' } | { status: 'unknown' };

export interface FewestOutcome {
	inks: number;
	ink: Int32Array;
	lowerBound: number;
}

/** Ways to find out about a number of inks. */
export interface Tries {
	quick: (inks: number) => Int32Array | null;
	exact: (inks: number) => Attempt;
	/** a colouring at hand with fewer inks than these */
	atHand?: (fewerThan: number) => { inks: number; ink: Int32Array } | null;
	/** hears the bounds whenever a question is put */
	told?: (atLeast: number, enough: number | null) => void;
}

/**
 * The fewest inks from `lowest` on: quick tries upwards until one succeeds, or what is at hand if that has
 * fewer; then exact answers downwards from there; where one stays open, exact answers upwards to raise the
 * bound. Null when no number up to `highest` succeeds.
 */
export function fewestInks(
	lowest: number,
	highest: number,
	{ quick, exact, atHand = () => null, told = () => undefined }: Tries,
): FewestOutcome | null {
	let best: FewestOutcome | null = null;
	told(lowest, null);
	for (let inks = lowest; inks <= highest && !best; inks++) {
		const ink = quick(inks);
		if (ink) best = { inks, ink, lowerBound: lowest };
	}
	if (!best) return null;
	if (best.inks > lowest) best = { ...best, ...atHand(best.inks) };
	while (best.inks > best.lowerBound) {
		told(best.lowerBound, best.inks);
		const answer = exact(best.inks - 1);
		if (answer.status === 'coloured') best = { ...best, inks: best.inks - 1, ink: answer.ink };
		else if (answer.status === 'refuted') best.lowerBound = best.inks;
		else break;
	}
	while (best.inks - 1 > best.lowerBound) {
		told(best.lowerBound, best.inks);
		const answer = exact(best.lowerBound);
		if (answer.status !== 'refuted') break;
		best.lowerBound++;
	}
	told(best.lowerBound, best.inks);
	return best;
}
