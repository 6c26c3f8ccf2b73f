import type { Pair, ProofFile } from '../proof-form.ts';

/** The pairs among some regions that must differ: borders, and regions kept apart. */
export interface Touching {
	has: (a: number, b: number) => boolean;
	/** how many different pairs */
	count: number;
	pairs: () => Pair[];
}

export function pairsWithin({ regions, borders, rules }: ProofFile, some: readonly number[]) {
	const inside = new Set(some);
	const many = regions.length;
	const code = (a: number, b: number) => (a < b ? a * many + b : b * many + a);
	const found = new Set<number>();
	for (const list of [borders, rules.apart]) {
		for (const [a, b] of list) if (inside.has(a) && inside.has(b)) found.add(code(a, b));
	}
	return {
		has: (a: number, b: number) => found.has(code(a, b)),
		count: found.size,
		pairs: () => Array.from(found, (pair): Pair => [Math.floor(pair / many), pair % many]),
	} satisfies Touching;
}
