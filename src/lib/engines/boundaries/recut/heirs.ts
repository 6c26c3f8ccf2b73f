import type { RegionMatch } from './region-match.ts';

/** Who goes on as whom, by number. */
export interface Heirs {
	/** by old region: the new ones that go on from it, the one with most of its ground first */
	now: number[][];
	/** by new region: the old ones that it goes on from, the one with most of its ground first */
	was: number[][];
	/** share (0 to 1) of a new region's area that an old one gave; 0 where they have no ground in common */
	shareOfNew(from: number, to: number): number;
	/** by old region: it goes on as one new region that goes on from nobody else */
	isOne: boolean[];
}

/** The joining links of a match as lists a region; equal shares in order of number. */
export function heirsOf({ before, after, links }: RegionMatch): Heirs {
	const now = before.keys.map((): number[] => []);
	const was = after.keys.map((): number[] => []);
	links.from.forEach((from, i) => {
		if (!links.joins[i]) return;
		now[from].push(i);
		was[links.to[i]].push(i);
	});
	const most = (column: number[]) => (a: number, b: number) => column[b] - column[a] || a - b;
	for (const list of now) list.sort(most(links.shareOfOld));
	for (const list of was) list.sort(most(links.shareOfNew));
	const isOne = now.map((list) => list.length === 1 && was[links.to[list[0]]].length === 1);
	const shares = new Map<string, number>();
	links.from.forEach((from, i) => shares.set(`${from} ${links.to[i]}`, links.shareOfNew[i]));
	return {
		now: now.map((list) => list.map((i) => links.to[i])),
		was: was.map((list) => list.map((i) => links.from[i])),
		shareOfNew: (from, to) => shares.get(`${from} ${to}`) ?? 0,
		isOne,
	};
}
