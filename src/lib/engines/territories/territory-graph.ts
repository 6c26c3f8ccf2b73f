import type { RegionGraph } from '../graph/region-graph.ts';

/** Pairs of territories next to each other: `a[i] < b[i]`, sorted by a then b. */
export interface TerritoryPairs {
	a: Uint32Array;
	b: Uint32Array;
	/** joined pairs of units between them */
	borders: Uint32Array;
	/** metres of line between them, null when no lengths were given */
	metres: Float64Array | null;
}

/**
 * Which territories are next to each other under an assignment, over how many joined pairs of units.
 *
 * `metres` holds a length for each entry of `graph.targets` (both directions of a pair alike). Units
 * without territory (-1) are left out. Linear time and a sort of the pairs.
 */
export function territoryGraph(
	{ offsets, targets, count }: RegionGraph,
	assignment: Int32Array,
	k: number,
	metres: Float64Array | null = null,
): TerritoryPairs {
	const borders = new Map<number, number>();
	const lengths = new Map<number, number>();
	for (let u = 0; u < count; u++) {
		const s = assignment[u];
		for (let i = offsets[u]; i < offsets[u + 1]; i++) {
			const t = assignment[targets[i]];
			if (s < 0 || t <= s) continue;
			const pair = s * k + t;
			borders.set(pair, (borders.get(pair) ?? 0) + 1);
			if (metres) lengths.set(pair, (lengths.get(pair) ?? 0) + metres[i]);
		}
	}
	const pairs = [...borders.keys()].sort((p, q) => p - q);
	return {
		a: Uint32Array.from(pairs, (pair) => Math.floor(pair / k)),
		b: Uint32Array.from(pairs, (pair) => pair % k),
		borders: Uint32Array.from(pairs, (pair) => borders.get(pair) ?? 0),
		metres: metres && Float64Array.from(pairs, (pair) => lengths.get(pair) ?? 0),
	};
}

/** How many joined pairs of units lie in two territories; a unit without territory (-1) cuts nothing. */
export function cutBorders(
	{ offsets, targets, count }: RegionGraph,
	assignment: Int32Array,
): number {
	let cut = 0;
	for (let u = 0; u < count; u++) {
		if (assignment[u] < 0) continue;
		for (let i = offsets[u]; i < offsets[u + 1]; i++) {
			// each pair once: from its side in the lower territory
			if (assignment[targets[i]] > assignment[u]) cut++;
		}
	}
	return cut;
}
