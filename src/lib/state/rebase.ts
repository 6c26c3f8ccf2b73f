import type { Draft } from '$lib/engines/editions/draft';
import { merger } from './merge';

/**
 * Two people changed the same draft. In: the draft both began from, mine, and theirs (already saved).
 * Out: theirs with my changes put on top, and the places where both had changed the same thing to
 * something different; there mine stands, and the caller says so. A three-way merge by field, by lock
 * and by rule; nothing else of theirs is lost.
 */
export function rebase(base: Draft, mine: Draft, theirs: Draft): { draft: Draft; both: string[] } {
	const { both, pick, fields, members } = merger();
	const [was, my, their] = [base.layout, mine.layout, theirs.layout];
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
			layout: {
				...fields('layout', was, my, their),
				frame: {
					...fields('frame', was.frame, my.frame, their.frame),
					insetChoices: fields(
						'inset',
						was.frame.insetChoices,
						my.frame.insetChoices,
						their.frame.insetChoices,
					),
				},
				lettering: {
					...fields('lettering', was.lettering, my.lettering, their.lettering),
					abbreviations: fields(
						'abbreviation of',
						was.lettering.abbreviations,
						my.lettering.abbreviations,
						their.lettering.abbreviations,
					),
					placed: fields(
						'place of',
						was.lettering.placed,
						my.lettering.placed,
						their.lettering.placed,
					),
					hidden: members(was.lettering.hidden, my.lettering.hidden, their.lettering.hidden),
					first: pick(
						'names that come first',
						was.lettering.first,
						my.lettering.first,
						their.lettering.first,
					),
				},
				lines: fields('lines', was.lines, my.lines, their.lines),
				collar: fields('collar', was.collar, my.collar, their.collar),
			},
			theme: pick('theme', base.theme, mine.theme, theirs.theme),
		},
		both,
	};
}
