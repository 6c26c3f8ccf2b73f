import type { MatchGroup, RegionMatch, Thresholds } from './region-match.ts';
import { inPercent, listedKeys, quoted } from './words.ts';

/** How much of each region's area the other side covers. */
export interface Shares {
	/** by old region: what the new regions of its own group cover, and what any new region does */
	oldInGroup: Float64Array;
	oldInAll: Float64Array;
	newInGroup: Float64Array;
	newInAll: Float64Array;
	/** by old region, and by new one: its links */
	linksOfOld: number[][];
	linksOfNew: number[][];
	/** by group: share of the old area, share of the new one */
	ofGroup: [number, number][];
	/** by key: its region in the other coverage */
	oldNumber: Map<string, number>;
	newNumber: Map<string, number>;
}

/** Sums the links of a match whose regions know their groups already. */
export function sharesOf(match: RegionMatch, groups: number): Shares {
	const { before, after, links, groupOfOld, groupOfNew } = match;
	const [oldInGroup, oldInAll] = [columnFor(before.keys), columnFor(before.keys)];
	const [newInGroup, newInAll] = [columnFor(after.keys), columnFor(after.keys)];
	const linksOfOld = before.keys.map((): number[] => []);
	const linksOfNew = after.keys.map((): number[] => []);
	links.from.forEach((from, i) => {
		const to = links.to[i];
		linksOfOld[from].push(i);
		linksOfNew[to].push(i);
		oldInAll[from] += links.shareOfOld[i];
		newInAll[to] += links.shareOfNew[i];
		if (groupOfOld[from] !== groupOfNew[to]) return;
		oldInGroup[from] += links.shareOfOld[i];
		newInGroup[to] += links.shareOfNew[i];
	});
	const ofOld = meanShares(groupOfOld, oldInGroup, before.km2, groups);
	const ofNew = meanShares(groupOfNew, newInGroup, after.km2, groups);
	return {
		...{ oldInGroup, oldInAll, newInGroup, newInAll, linksOfOld, linksOfNew },
		ofGroup: ofOld.map((share, group): [number, number] => [share, ofNew[group]]),
		oldNumber: new Map(before.keys.map((key, region) => [key, region])),
		newNumber: new Map(after.keys.map((key, region) => [key, region])),
	};
}

const columnFor = (keys: string[]) => new Float64Array(keys.length);

function meanShares(groupOf: number[], share: Float64Array, km2: number[], groups: number) {
	const covered = new Array<number>(groups).fill(0);
	const whole = new Array<number>(groups).fill(0);
	groupOf.forEach((group, region) => {
		covered[group] += share[region] * km2[region];
		whole[group] += km2[region];
	});
	return covered.map((area, group) => (whole[group] > 0 ? Math.min(1, area / whole[group]) : 0));
}

/** What there is to doubt about a group, in sentences; none when the match is sure. */
export function doubtsOf(
	match: RegionMatch,
	group: MatchGroup,
	shares: Shares,
	limits: Thresholds,
): string[] {
	return [
		...groundDoubts(match, group, shares, limits),
		...keyDoubts(match, group, shares),
		...(group.outcome === 'redrawn' ? ['Several regions became several others.'] : []),
	];
}

function groundDoubts(
	match: RegionMatch,
	group: MatchGroup,
	shares: Shares,
	{ sure }: Thresholds,
): string[] {
	if (group.outcome === 'gone') {
		const [region] = group.before;
		return shares.oldInAll[region] > 1 - sure ? [stillThere(match, shares.linksOfOld[region])] : [];
	}
	if (group.outcome === 'new') {
		const [region] = group.after;
		return shares.newInAll[region] > 1 - sure ? [wasThere(match, shares.linksOfNew[region])] : [];
	}
	const doubts: string[] = [];
	const old = least(group.before, shares.oldInGroup);
	if (shares.oldInGroup[old] < sure) {
		const share = inPercent(shares.oldInGroup[old]);
		doubts.push(`Only ${share} of the ground of ${quoted(match.before.keys[old])} goes on here.`);
	}
	const fresh = least(group.after, shares.newInGroup);
	if (shares.newInGroup[fresh] < sure) {
		const share = inPercent(shares.newInGroup[fresh]);
		const key = quoted(match.after.keys[fresh]);
		doubts.push(`Only ${share} of the ground of the new ${key} comes from here.`);
	}
	return doubts;
}

const least = (regions: number[], share: Float64Array) =>
	regions.reduce((best, region) => (share[region] < share[best] ? region : best));

function stillThere({ links, after }: RegionMatch, at: number[]): string {
	const column = links.shareOfOld;
	const now = [...at].sort((a, b) => column[b] - column[a]);
	const keys = now.map((i) => `${quoted(after.keys[links.to[i]])} (${inPercent(column[i])})`);
	return `Its ground is now in ${listedKeys(keys)}.`;
}

function wasThere({ links, before }: RegionMatch, at: number[]): string {
	const column = links.shareOfNew;
	const once = [...at].sort((a, b) => column[b] - column[a]);
	const keys = once.map((i) => `${quoted(before.keys[links.from[i]])} (${inPercent(column[i])})`);
	return `Its ground was in ${listedKeys(keys)}.`;
}

/** Keys that stand for other ground on the other side. */
function keyDoubts(match: RegionMatch, group: MatchGroup, shares: Shares): string[] {
	const { before, after, groupOfOld, groupOfNew } = match;
	const doubts: string[] = [];
	for (const region of group.before) {
		const now = shares.newNumber.get(before.keys[region]);
		if (now !== undefined && groupOfNew[now] !== groupOfOld[region]) {
			doubts.push(`The key ${quoted(before.keys[region])} now stands for other ground.`);
		}
	}
	for (const region of group.after) {
		const once = shares.oldNumber.get(after.keys[region]);
		if (once !== undefined && groupOfOld[once] !== groupOfNew[region]) {
			doubts.push(`The key ${quoted(after.keys[region])} stood for other ground.`);
		}
	}
	return doubts;
}
