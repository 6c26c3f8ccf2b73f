/**
 * What the checker takes on. Files come from anybody: each limit is far above what a map needs, and
 * together they keep time and memory in bounds.
 */
export const limits = {
	/** characters of a file */
	text: 64 * 2 ** 20,
	/** brackets within brackets */
	depth: 20,
	regions: 2_000_000,
	pairs: 10_000_000,
	inks: 65_535,
	claims: 8,
	/** characters of a key or a name */
	name: 2_000,
	/** pairs looked up for a clique */
	cliquePairs: 2_000_000,
	/** variables and clauses written down for one refutation */
	variables: 500_000,
	clauses: 1_000_000,
	/** literals in the lines of one refutation, eight more for each line */
	literals: 40_000_000,
	/** literals looked at for all refutations of a file */
	steps: 1_000_000_000,
};
