import { groupWords } from './group-words.ts';
import { doubtsOf, sharesOf, type Shares } from './group-doubts.ts';
import type {
	MatchGroup,
	MatchLinks,
	MatchSide,
	Outcome,
	RegionMatch,
	Thresholds,
} from './region-match.ts';

/** Regions that a person decided about, so that what their groups say counts as decided. */
export interface ByHand {
	has(region: string): boolean;
}

/** How a region of either side is named among those decided by hand. */
export const oldRegion = (region: number) => `old ${region}`;
export const newRegion = (region: number) => `new ${region}`;

/** Puts regions that joining links hold together into groups and says what became of each group. */
export function groupRegions(
	before: MatchSide,
	after: MatchSide,
	links: MatchLinks,
	byHand: ByHand,
	limits: Thresholds,
): RegionMatch {
	const members = connected(before.keys.length, after.keys.length, links);
	const groupOfOld = new Array<number>(before.keys.length);
	const groupOfNew = new Array<number>(after.keys.length);
	members.forEach(([olds, news], group) => {
		for (const region of olds) groupOfOld[region] = group;
		for (const region of news) groupOfNew[region] = group;
	});
	const match: RegionMatch = { before, after, groups: [], groupOfOld, groupOfNew, links };
	const shares = sharesOf(match, members.length);
	match.groups = members.map(([olds, news], group) => {
		const isHand =
			olds.some((region) => byHand.has(oldRegion(region))) ||
			news.some((region) => byHand.has(newRegion(region)));
		return describe(match, olds, news, isHand, shares, shares.ofGroup[group], limits);
	});
	return match;
}

function describe(
	match: RegionMatch,
	before: number[],
	after: number[],
	isHand: boolean,
	shares: Shares,
	[shareOfOld, shareOfNew]: [number, number],
	limits: Thresholds,
): MatchGroup {
	const outcome = outcomeOf(match, before, after);
	const isOne = outcome === 'kept' || outcome === 'renamed';
	const group: MatchGroup = {
		outcome,
		before,
		after,
		by: isHand ? 'hand' : outcome === 'kept' ? 'key' : 'area',
		shareOfOld,
		shareOfNew,
		outlineChanged: !isOne || Math.min(shareOfOld, shareOfNew) < 1 - limits.unchanged,
		sure: true,
		words: '',
	};
	const doubts = isHand ? [] : doubtsOf(match, group, shares, limits);
	group.sure = doubts.length === 0;
	group.words = [groupWords(match, group), ...doubts].join(' ');
	return group;
}

function outcomeOf(match: RegionMatch, before: number[], after: number[]): Outcome {
	if (before.length === 0) return 'new';
	if (after.length === 0) return 'gone';
	if (before.length > 1) return after.length > 1 ? 'redrawn' : 'merged';
	if (after.length > 1) return 'split';
	return match.before.keys[before[0]] === match.after.keys[after[0]] ? 'kept' : 'renamed';
}

/** Old and new regions that hang together, in order of the first old one, then of the first new one. */
function connected(olds: number, news: number, links: MatchLinks): [number[], number[]][] {
	const parent = Int32Array.from({ length: olds + news }, (_, i) => i);
	const root = (i: number): number => {
		while (parent[i] !== i) i = parent[i] = parent[parent[i]];
		return i;
	};
	links.from.forEach((from, i) => {
		if (links.joins[i]) parent[root(olds + links.to[i])] = root(from);
	});
	const groups = new Map<number, [number[], number[]]>();
	for (let i = 0; i < olds + news; i++) {
		const at = root(i);
		const group = groups.get(at) ?? [[], []];
		groups.set(at, group);
		if (i < olds) group[0].push(i);
		else group[1].push(i - olds);
	}
	return [...groups.values()];
}
