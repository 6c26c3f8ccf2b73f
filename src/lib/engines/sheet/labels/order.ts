import type { ArcSides } from '../lines.ts';

/** How many other regions each region lies next to along a line. */
export function neighbourCounts({ arcLeft, arcRight }: ArcSides, regions: number): Uint32Array {
	const counts = new Uint32Array(regions);
	const seen = new Set<number>();
	for (let arc = 0; arc < arcLeft.length; arc++) {
		const [a, b] = [arcLeft[arc], arcRight[arc]];
		if (a < 0 || b < 0 || a === b) continue;
		const pair = Math.min(a, b) * regions + Math.max(a, b);
		if (seen.size === seen.add(pair).size) continue;
		counts[a]++;
		counts[b]++;
	}
	return counts;
}

/**
 * Regions in the order in which their names are set: those put first, then by the figure, the greatest
 * first, then by area, then by number.
 */
export function nameOrder(
	first: readonly number[],
	figure: ArrayLike<number>,
	areas: ArrayLike<number>,
): number[] {
	const early = new Set(first);
	const rest = Array.from(areas, (_, region) => region).filter((region) => !early.has(region));
	rest.sort((a, b) => figure[b] - figure[a] || areas[b] - areas[a] || a - b);
	return [...early, ...rest];
}
