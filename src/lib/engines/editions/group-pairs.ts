import type { GroupRule } from './draft.ts';

export type NumberedPair = readonly [number, number];

/**
 * What the rules for many regions at once say of pairs. `alike`: a chain through the regions of each such
 * group, one pair less than it has regions; `different`: every pair of each. Regions that `numbers` does
 * not know are passed over, and one named twice counts once. Linear in what is written out: a group of 64
 * that all differ is 2,016 pairs.
 */
export function groupPairs(
	groups: readonly GroupRule[],
	numbers: ReadonlyMap<string, number>,
): { alike: NumberedPair[]; apart: NumberedPair[] } {
	const alike: NumberedPair[] = [];
	const apart: NumberedPair[] = [];
	for (const { kind, keys } of groups) {
		const regions = regionsOf(keys, numbers);
		if (kind === 'alike') pushChain(alike, regions);
		else pushEveryPair(apart, regions);
	}
	return { alike, apart };
}

function regionsOf(keys: readonly string[], numbers: ReadonlyMap<string, number>): number[] {
	const regions = new Set<number>();
	for (const key of keys) {
		const region = numbers.get(key);
		if (region !== undefined) regions.add(region);
	}
	return [...regions];
}

function pushChain(pairs: NumberedPair[], regions: number[]): void {
	for (let i = 1; i < regions.length; i++) pairs.push([regions[i - 1], regions[i]]);
}

function pushEveryPair(pairs: NumberedPair[], regions: number[]): void {
	for (let i = 1; i < regions.length; i++) {
		for (let j = 0; j < i; j++) pairs.push([regions[j], regions[i]]);
	}
}
