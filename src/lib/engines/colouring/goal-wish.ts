import type { Reader } from '../colour/reader.ts';

/**
 * What a colouring is wanted to be, besides keeping every rule. `even-…`: inks carry equal shares of the
 * regions or of their area; `distinct`: neighbours look as different as can be, the weakest pairs of inks
 * along the fewest metres; `same-ink-apart`: regions of one ink lie far from each other.
 */
export type GoalKind =
	'fewest-changes' | 'even-count' | 'even-area' | 'distinct' | 'same-ink-apart';

export const goalKinds: readonly GoalKind[] = [
	'fewest-changes',
	'even-count',
	'even-area',
	'distinct',
	'same-ink-apart',
];

/** One goal of several, in an order: a later one is followed as far as the earlier ones allow. */
export interface GoalWish {
	kind: GoalKind;
	/** share of what this goal has gained since the start that later ones may give away again, 0 to 1 */
	give: number;
	/** whose eyes count for `distinct`; all when absent */
	readers?: Reader[];
	/** what `fewest-changes` is measured against; the last saved colouring when absent */
	against?: { edition: number } | { revision: number };
}
