import type { BorderList } from '../../engines/borders/index.ts';
import type { Finding } from '../../engines/boundaries/index.ts';
import type { MatchGroup, MatchSide, RegionMatch } from '../../engines/boundaries/recut/index.ts';
import {
	mostFindings,
	mostListed,
	type RecutChange,
	type RecutGroup,
	type RecutOutcome,
	type RecutRegion,
} from '../../schemas/recut.ts';
import { pairChanges } from './recut-pairs.ts';

/** One side of a re-cut, as far as it is compared. */
export interface ComparedSide {
	borders: BorderList;
	findings: Finding[];
}

/** What a re-cut would change, as its page shows it. */
export const changeOf = (
	match: RegionMatch,
	before: ComparedSide,
	after: ComparedSide,
): RecutChange => ({
	...regionsOf(match),
	pairs: pairChanges(match, before.borders, after.borders),
	findings: findingChanges(before.findings, after.findings),
});

/** The part that the matching decides. */
export function regionsOf(
	match: RegionMatch,
): Pick<RecutChange, 'regions' | 'counts' | 'groups' | 'groupsLeftOut'> {
	const counts = Object.fromEntries(
		outcomes.map((outcome) => [outcome, 0]),
	) as RecutChange['counts'];
	for (const { outcome, before, after } of match.groups) {
		counts[outcome] += outcome === 'new' ? after.length : before.length;
	}
	const covered = coveredShares(match);
	const told = match.groups.filter(isTold);
	const shown = [...told.filter(({ sure }) => !sure), ...told.filter(({ sure }) => sure)];
	return {
		regions: { before: match.before.keys.length, after: match.after.keys.length },
		counts,
		groups: shown.slice(0, mostListed).map((group) => groupOf(match, group, covered)),
		groupsLeftOut: Math.max(0, shown.length - mostListed),
	};
}

const outcomes: RecutOutcome[] = ['kept', 'renamed', 'split', 'merged', 'redrawn', 'new', 'gone'];

/** A region that is the same in key and ground needs no line of its own. */
const isTold = ({ outcome, sure, by }: MatchGroup): boolean =>
	outcome !== 'kept' || !sure || by === 'hand';

/** A group may hold a whole country; its page shows so many regions of either side. */
const mostRegions = 100;

function groupOf(
	{ before, after }: RegionMatch,
	group: MatchGroup,
	covered: ReturnType<typeof coveredShares>,
): RecutGroup {
	const some = (regions: number[]) => regions.slice(0, mostRegions);
	return {
		outcome: group.outcome,
		before: some(group.before).map((region) => regionOf(before, region, covered.before[region])),
		after: some(group.after).map((region) => regionOf(after, region, covered.after[region])),
		by: group.by,
		doubt: group.sure ? null : group.words,
		words: group.words,
	};
}

const regionOf = ({ keys, names, km2 }: MatchSide, region: number, share: number): RecutRegion => ({
	...{ key: keys[region], name: names[region], areaKm2: km2[region] },
	share: Math.min(1, share),
});

/** Share of every region's area that the other side of its group covers. */
function coveredShares({ before, after, links, groupOfOld, groupOfNew }: RegionMatch) {
	const shares = {
		before: new Float64Array(before.keys.length),
		after: new Float64Array(after.keys.length),
	};
	links.from.forEach((from, i) => {
		const to = links.to[i];
		if (groupOfOld[from] !== groupOfNew[to]) return;
		shares.before[from] += links.shareOfOld[i];
		shares.after[to] += links.shareOfNew[i];
	});
	return shares;
}

/** Findings are the same when they say the same about the same regions. */
function findingChanges(before: Finding[], after: Finding[]): RecutChange['findings'] {
	const come = without(after, before);
	const gone = without(before, after);
	return {
		gone: gone.slice(0, mostFindings).map(plain),
		come: come.slice(0, mostFindings).map(plain),
		counts: { gone: gone.length, come: come.length },
	};
}

function without(all: Finding[], known: Finding[]): Finding[] {
	const left = new Map<string, number>();
	for (const finding of known) left.set(essence(finding), (left.get(essence(finding)) ?? 0) + 1);
	return all.filter((finding) => {
		const count = left.get(essence(finding)) ?? 0;
		if (count > 0) left.set(essence(finding), count - 1);
		return count === 0;
	});
}

const essence = ({ code, message, regions }: Finding): string =>
	JSON.stringify([code, message, [...regions].sort()]);

const plain = ({ code, severity, message, regions, at }: Finding): Finding => ({
	...{ code, severity, message, at },
	regions: regions.slice(0, mostRegions),
});
