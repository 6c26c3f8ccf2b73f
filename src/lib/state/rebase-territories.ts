import type { TerritoryDraft, TerritoryEntry } from '$lib/engines/territories/territory-draft';
import { merger, without, type Merger } from './merge';

/**
 * Two people changed the territories of one sheet. Out: theirs with my changes on top, and what both had
 * changed differently, where mine stands. What names a territory that is gone goes with it.
 */
export function rebaseTerritories(
	base: TerritoryDraft,
	mine: TerritoryDraft,
	theirs: TerritoryDraft,
): { draft: TerritoryDraft; both: string[] } {
	const merge = merger();
	const { fields, members } = merge;
	const territories = mergedEntries(merge, base, mine, theirs);
	const there = new Set(territories.map(({ key }) => key));
	const assignment = fields('region', base.assignment, mine.assignment, theirs.assignment);
	const locks = fields('lock on', base.locks, mine.locks, theirs.locks);
	return {
		draft: {
			territories,
			assignment: only(assignment, (key) => there.has(key)),
			locks: only(locks, ({ territory }) => there.has(territory)),
			together: members(base.together, mine.together, theirs.together),
			apart: members(base.apart, mine.apart, theirs.apart),
			waterLinks: members(base.waterLinks, mine.waterLinks, theirs.waterLinks),
			handLinks: members(base.handLinks, mine.handLinks, theirs.handLinks),
			wishes: {
				...fields(
					'wish',
					without(base.wishes, 'tolerances'),
					without(mine.wishes, 'tolerances'),
					without(theirs.wishes, 'tolerances'),
				),
				tolerances: fields(
					'tolerance of',
					base.wishes.tolerances,
					mine.wishes.tolerances,
					theirs.wishes.tolerances,
				),
			},
		},
		both: merge.both,
	};
}

/** Their list in their order, less those I removed, plus those I added; each entry merged by field. */
function mergedEntries(
	{ fields }: Merger,
	base: TerritoryDraft,
	mine: TerritoryDraft,
	theirs: TerritoryDraft,
): TerritoryEntry[] {
	const [was, my, their] = [base, mine, theirs].map(
		({ territories }) => new Map(territories.map((entry) => [entry.key, entry])),
	);
	const stay = theirs.territories.flatMap((entry) => {
		const [before, now] = [was.get(entry.key), my.get(entry.key)];
		if (before && now) return [fields(`territory ${before.name},`, before, now, entry)];
		return before ? [] : [entry];
	});
	const added = mine.territories.filter(({ key }) => !was.has(key) && !their.has(key));
	return [...stay, ...added];
}

const only = <T>(record: Record<string, T>, stays: (value: T) => boolean): Record<string, T> =>
	Object.fromEntries(Object.entries(record).filter(([, value]) => stays(value)));
