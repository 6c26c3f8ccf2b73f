import type { MatchGroup, RegionMatch } from './region-match.ts';
import { inPercent, listedKeys, quoted } from './words.ts';

/** What happened to the regions of a group, in one sentence or two. */
export function groupWords(match: RegionMatch, group: MatchGroup): string {
	const olds = listedKeys(group.before.map((region) => quoted(match.before.keys[region])));
	const news = listedKeys(group.after.map((region) => quoted(match.after.keys[region])));
	return `${group.by === 'hand' ? 'Decided by hand: ' : ''}${whatHappened(group, olds, news)}`;
}

function whatHappened(group: MatchGroup, olds: string, news: string): string {
	switch (group.outcome) {
		case 'kept':
			return `${olds} stays.${redrawn(group)}`;
		case 'renamed':
			return `${olds} is now called ${news}.${redrawn(group)}`;
		case 'split':
			return `${olds} is split into ${news}.`;
		case 'merged':
			return `${olds} are merged into ${news}.`;
		case 'redrawn':
			return `${olds} are redrawn as ${news}.`;
		case 'gone':
			return `${olds} is gone.`;
		case 'new':
			return `${news} is new.`;
	}
}

function redrawn({ outlineChanged, shareOfOld, shareOfNew }: MatchGroup): string {
	if (!outlineChanged) return '';
	const same = inPercent(Math.min(shareOfOld, shareOfNew));
	return ` Its outline is drawn otherwise; ${same} of the ground is the same.`;
}
