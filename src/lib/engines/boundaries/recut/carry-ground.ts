import type { BorderList } from '../../borders/border-list.ts';
import { heirsOf, type Heirs } from './heirs.ts';
import type { RegionMatch } from './region-match.ts';

/** What decisions are carried over by. */
export interface CarryGround {
	match: RegionMatch;
	heirs: Heirs;
	/** number of an old region by key */
	old(key: string): number | undefined;
	/** new regions that go on from an old one, by its key; none where there is no such region */
	heirsOf(key: string): number[];
	/** key of a new region */
	key(fresh: number): string;
}

/** The lists and look-ups of a match. */
export function carryGround(match: RegionMatch): CarryGround {
	const numbers = new Map(match.before.keys.map((key, region) => [key, region]));
	const heirs = heirsOf(match);
	return {
		match,
		heirs,
		old: (key) => numbers.get(key),
		heirsOf: (key) => {
			const region = numbers.get(key);
			return region === undefined ? [] : heirs.now[region];
		},
		key: (fresh) => match.after.keys[fresh],
	};
}

/** Whether two regions are a pair of a list, in either order. */
export type PairTest = (a: number, b: number) => boolean;

/** Looks pairs up in a list of borders; `counts` may leave some of its entries out. */
export function pairTest(
	{ a, b }: Pick<BorderList, 'a' | 'b'>,
	regions: number,
	counts: (entry: number) => boolean = () => true,
): PairTest {
	const pairs = new Set<number>();
	a.forEach((one, i) => {
		if (counts(i)) pairs.add(one * regions + b[i]).add(b[i] * regions + one);
	});
	return (one, other) => pairs.has(one * regions + other);
}

/** The first of a list, and each next one that is no pair with one taken before it. */
export function apartFrom(regions: number[], isPair: PairTest | null): number[] {
	const taken: number[] = [];
	for (const region of regions) {
		if (!isPair || !taken.some((other) => isPair(region, other))) taken.push(region);
	}
	return taken;
}
