import type { Decision, DecideResult } from './decision.ts';
import { groupRegions, newRegion, oldRegion } from './group-regions.ts';
import { thresholds, type MatchLinks, type RegionMatch, type Thresholds } from './region-match.ts';
import { quoted } from './words.ts';

/**
 * Corrects a match by what people decided: `continues` puts the named new regions in the place of all
 * that the old region went on as; `gone` and `new` let a region stand alone. Decisions count together,
 * in whatever order. Other regions keep what they had, so naming a new region that already goes on from
 * another old one merges the two.
 *
 * In: a match (its own earlier decisions stay); decisions by key. Out: the match with groups made anew,
 * those with a decision in them `by: 'hand'` and sure; or `refused` with a sentence for everything that
 * cannot be: a key that is not there, a region decided twice or against itself. The match given is not
 * changed. Never throws.
 */
export function decide(
	match: RegionMatch,
	decisions: readonly Decision[],
	options: Partial<Thresholds> = {},
): DecideResult {
	const olds = new Map(match.before.keys.map((key, region) => [key, region]));
	const news = new Map(match.after.keys.map((key, region) => [key, region]));
	const reasons = decisionFaults(decisions, olds, news);
	if (reasons.length > 0) return { status: 'refused', reasons };
	const byHand = handRegions(match);
	const ended = new Set<string>();
	const wanted = new Set<string>();
	for (const decision of decisions) {
		if (decision.kind === 'new') {
			ended.add(newRegion(news.get(decision.region)!));
			continue;
		}
		const from = olds.get(decision.old)!;
		ended.add(oldRegion(from));
		if (decision.kind === 'gone') continue;
		for (const key of decision.as) wanted.add(`${from} ${news.get(key)!}`);
	}
	for (const region of ended) byHand.add(region);
	const links = decidedLinks(match.links, ended, wanted, byHand);
	const limits = { ...thresholds, ...options };
	return {
		status: 'decided',
		match: groupRegions(match.before, match.after, links, byHand, limits),
	};
}

/** Regions of groups that were decided before. */
function handRegions({ groups }: RegionMatch): Set<string> {
	const byHand = new Set<string>();
	for (const { by, before, after } of groups) {
		if (by !== 'hand') continue;
		for (const region of before) byHand.add(oldRegion(region));
		for (const region of after) byHand.add(newRegion(region));
	}
	return byHand;
}

function decidedLinks(
	links: MatchLinks,
	ended: Set<string>,
	wanted: Set<string>,
	byHand: Set<string>,
): MatchLinks {
	const missing = new Set(wanted);
	const rows = links.from.map((from, i) => {
		const to = links.to[i];
		const isWanted = missing.delete(`${from} ${to}`);
		const isEnded = ended.has(oldRegion(from)) || ended.has(newRegion(to));
		const joins = isWanted || (links.joins[i] && !isEnded);
		if (joins !== links.joins[i]) byHand.add(oldRegion(from)).add(newRegion(to));
		const { km2, shareOfOld, shareOfNew } = links;
		return { from, to, km2: km2[i], shareOfOld: shareOfOld[i], shareOfNew: shareOfNew[i], joins };
	});
	for (const pair of missing) {
		const [from, to] = pair.split(' ').map(Number);
		rows.push({ from, to, km2: 0, shareOfOld: 0, shareOfNew: 0, joins: true });
		byHand.add(oldRegion(from)).add(newRegion(to));
	}
	rows.sort((a, b) => a.from - b.from || a.to - b.to);
	return {
		from: rows.map(({ from }) => from),
		to: rows.map(({ to }) => to),
		km2: rows.map(({ km2 }) => km2),
		shareOfOld: rows.map(({ shareOfOld }) => shareOfOld),
		shareOfNew: rows.map(({ shareOfNew }) => shareOfNew),
		joins: rows.map(({ joins }) => joins),
	};
}

function decisionFaults(
	decisions: readonly Decision[],
	olds: Map<string, number>,
	news: Map<string, number>,
): string[] {
	const reasons = new Set<string>();
	const isNew = new Set(decisions.flatMap((d) => (d.kind === 'new' ? [d.region] : [])));
	const seen = new Set<string>();
	const once = (side: string, key: string) => {
		if (seen.has(`${side} ${key}`)) reasons.add(`${quoted(key)} is decided twice.`);
		seen.add(`${side} ${key}`);
	};
	for (const decision of decisions) {
		if (decision.kind === 'new') {
			once('new', decision.region);
			if (!news.has(decision.region)) reasons.add(noNew(decision.region));
			continue;
		}
		once('old', decision.old);
		if (!olds.has(decision.old)) reasons.add(`There was no region ${quoted(decision.old)}.`);
		if (decision.kind === 'gone') continue;
		if (decision.as.length === 0) {
			reasons.add(`Say as which new region ${quoted(decision.old)} goes on, or that it is gone.`);
		}
		for (const key of decision.as) {
			if (!news.has(key)) reasons.add(noNew(key));
			if (isNew.has(key)) {
				reasons.add(`${quoted(key)} cannot be new and go on from ${quoted(decision.old)}.`);
			}
		}
	}
	return [...reasons];
}

const noNew = (key: string) => `There is no new region ${quoted(key)}.`;
