import type { Coverage } from '../coverage.ts';
import { commonGround, type Common } from './common-ground.ts';
import { groupRegions } from './group-regions.ts';
import {
	thresholds,
	type MatchLinks,
	type MatchSide,
	type RegionMatch,
	type Thresholds,
} from './region-match.ts';
import { sameOutlines } from './same-outlines.ts';

/** Areas are exact to about 1e-12 of themselves; a region cut in two halves must not depend on that. */
const rounding = 1e-6;

/**
 * Finds how the regions of an earlier coverage go on in a later one.
 *
 * In: two coverages as an engine returns them (`coverageFaults` is empty); longitudes may be unwrapped at
 * other meridians. Options: other `thresholds`. Out: a match in which every region of either side is in
 * exactly one group, with the area of every pair that has ground in common.
 *
 * Method: regions drawn through the same points are paired first. For the others the common areas are
 * measured. The same key counts where at least half of either region's ground is common to both; a key that
 * stands elsewhere now is told as a doubt and matches nothing. A new region goes on from an old one where
 * half of either is in common, unless both have gone on by key as others; what hangs together is a group.
 * A region drawn through the same points as one before it is measured against that one only, even where it
 * overlaps others of its own file.
 *
 * Deterministic; does not depend on the order of regions but for the order of the groups. Never fails.
 */
export function matchRegions(
	before: Coverage,
	after: Coverage,
	options: Partial<Thresholds> = {},
): RegionMatch {
	const limits = { ...thresholds, ...options };
	const common = allCommon(before, after).filter(
		({ shareOfOld, shareOfNew }) => Math.max(shareOfOld, shareOfNew) >= limits.mention,
	);
	common.sort((a, b) => a.from - b.from || a.to - b.to);
	const old = sideOf(before);
	const fresh = sideOf(after);
	const links = linksOf(old, common, joinsOf(old, fresh, common, limits));
	return groupRegions(old, fresh, links, new Set(), limits);
}

const sideOf = ({ keys, names, areasKm2 }: Coverage): MatchSide => ({
	keys: [...keys],
	names: [...names],
	km2: Array.from(areasKm2),
});

function allCommon(before: Coverage, after: Coverage): Common[] {
	const same = sameOutlines(before, after);
	const isSettled = new Uint8Array(after.keys.length);
	const common: Common[] = [];
	same.forEach((to, from) => {
		if (to < 0) return;
		isSettled[to] = 1;
		common.push({ from, to, shareOfOld: 1, shareOfNew: 1 });
	});
	const rest = commonGround(
		before,
		after,
		(region) => same[region] < 0,
		(region) => !isSettled[region],
	);
	for (const one of rest) common.push(one);
	return common;
}

/** Which pairs make groups: see the method above. */
function joinsOf(
	old: MatchSide,
	fresh: MatchSide,
	common: Common[],
	limits: Thresholds,
): boolean[] {
	const isStrong = ({ shareOfOld, shareOfNew }: Common) =>
		Math.max(shareOfOld, shareOfNew) >= limits.half - rounding;
	const byKey = (pair: Common) => isStrong(pair) && old.keys[pair.from] === fresh.keys[pair.to];
	const oldByKey = new Set<number>();
	const newByKey = new Set<number>();
	for (const pair of common) {
		if (!byKey(pair)) continue;
		oldByKey.add(pair.from);
		newByKey.add(pair.to);
	}
	return common.map(
		(pair) =>
			byKey(pair) || (isStrong(pair) && !(oldByKey.has(pair.from) && newByKey.has(pair.to))),
	);
}

const linksOf = (old: MatchSide, common: Common[], joins: boolean[]): MatchLinks => ({
	from: common.map(({ from }) => from),
	to: common.map(({ to }) => to),
	km2: common.map(({ from, shareOfOld }) => shareOfOld * old.km2[from]),
	shareOfOld: common.map(({ shareOfOld }) => shareOfOld),
	shareOfNew: common.map(({ shareOfNew }) => shareOfNew),
	joins,
});
