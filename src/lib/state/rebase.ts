import type { Draft } from '$lib/engines/editions/draft';
import { merger } from './merge';
import { rebaseLayout } from './rebase-layout';

/**
 * Two people changed the same draft. In: the draft both began from, mine, and theirs (already saved).
 * Out: theirs with my changes put on top, and the places where both had changed the same thing to
 * something different; there mine stands, and the caller says so. A three-way merge by field, by lock
 * and by rule; nothing else of theirs is lost.
 */
export function rebase(base: Draft, mine: Draft, theirs: Draft): { draft: Draft; both: string[] } {
	const merge = merger();
	const { both, pick, fields, members } = merge;
	return {
		draft: {
			inks: pick('number of inks', base.inks, mine.inks, theirs.inks),
			palette: pick('palette', base.palette, mine.palette, theirs.palette),
			locks: fields('lock on', base.locks, mine.locks, theirs.locks),
			forbidden: members(base.forbidden, mine.forbidden, theirs.forbidden),
			alike: members(base.alike, mine.alike, theirs.alike),
			apart: members(base.apart, mine.apart, theirs.apart),
			groups: members(base.groups, mine.groups, theirs.groups),
			reserved: members(base.reserved, mine.reserved, theirs.reserved),
			goals: pick('goals', base.goals, mine.goals, theirs.goals),
			ties: members(base.ties, mine.ties, theirs.ties),
			pointTouches: pick(
				'point touches',
				base.pointTouches,
				mine.pointTouches,
				theirs.pointTouches,
			),
			leastMetres: pick(
				'shortest line that counts',
				base.leastMetres,
				mine.leastMetres,
				theirs.leastMetres,
			),
			waterKm: pick('gap that counts', base.waterKm, mine.waterKm, theirs.waterKm),
			struck: members(base.struck, mine.struck, theirs.struck),
			added: members(base.added, mine.added, theirs.added),
			seed: pick('seed', base.seed, mine.seed, theirs.seed),
			layout: rebaseLayout(merge, base.layout, mine.layout, theirs.layout),
			theme: pick('theme', base.theme, mine.theme, theirs.theme),
		},
		both,
	};
}
