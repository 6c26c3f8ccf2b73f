import { bordersForSheet, type BorderList } from '../borders/index.ts';
import {
	apartFrom,
	carriedRow,
	carryGround,
	carryPairs,
	everyPair,
	pairTest,
	quoted,
	type CarriedRow,
	type CarryGround,
	type Carrying,
	type Choose,
	type PairTest,
	type RegionMatch,
} from '../boundaries/recut/index.ts';
import { carryGroups } from './carry-groups.ts';
import { carryLettering } from './carry-lettering.ts';
import { carryLocks } from './carry-locks.ts';
import type { Draft } from './draft.ts';
import { inkName } from './ink-name.ts';

/** What else is known of the new boundaries. */
export interface NewGround {
	/** borders of the new coverage, by the numbers of its regions */
	borders?: BorderList;
	/** columns of its attribute table */
	columns?: readonly string[];
}

export interface CarriedDraft {
	draft: Draft;
	/** one row or more for everything that names regions, in the order of the draft */
	rows: CarriedRow[];
}

/**
 * What people decided about a sheet, carried over to new boundaries.
 *
 * In: the draft by old keys; the match (corrected by hand or not); what is known of the new boundaries:
 * their borders, by which struck borders are looked up and locks kept off neighbouring pieces, and the
 * columns of their attribute table. Out: a draft that names new regions only, and a report of what
 * followed and what did not. The draft given is not changed.
 *
 * Rules. Regions that go on one as one keep everything. Split: bans and keep-apart go to each piece; locks
 * and keep-alike too, but to no piece that touches a larger one with the same. Merged: locks as
 * `carryPins` says; bans of every part; what was between two regions that are one now is dropped, and
 * keep-alike where keep-apart stands. Struck borders follow where there is a border, added ones where
 * there are two regions. Groups follow as `carryGroups` says. Reserved inks, goals and ties name no
 * region and stay; a lock or ban that a tie asked for keeps its mark. Names follow as `carryLettering`
 * says. A layout by a column that is missing is no longer by that column.
 * Over the same boundaries a draft without doubled rules comes back as it was. Never throws.
 */
export function carryDraft(draft: Draft, match: RegionMatch, fresh: NewGround = {}): CarriedDraft {
	const ground = carryGround(match);
	const regions = match.after.keys.length;
	const hasBorder = fresh.borders ? pairTest(fresh.borders, regions) : null;
	const struck = carryHandBorders(ground, draft.struck, 'struck', hasBorder);
	const added = carryHandBorders(ground, draft.added, 'added', null);
	const { pointTouches, leastMetres, waterKm } = draft;
	const hand = { struck: struck.list, added: added.list };
	const rules = { pointTouches, leastMetres, waterKm, ...hand };
	const counted = fresh.borders
		? bordersForSheet(match.after.keys, fresh.borders, { ...draft, ...rules })
		: null;
	const mustDiffer = counted ? pairTest(counted, regions) : null;
	const forbidden = carryForbidden(ground, draft);
	const locks = carryLocks(ground, draft, forbidden.list, mustDiffer);
	const apart = carryRules(ground, draft.apart, 'apart', everyPair);
	const alike = carryRules(
		ground,
		draft.alike,
		'alike',
		alikePairs(ground, apart.list, mustDiffer),
	);
	const groups = carryGroups(ground, draft.groups, counted, apart.list);
	const layout = carryLayout(draft.layout, fresh.columns);
	const names = carryLettering(ground, layout.layout.lettering);
	return {
		draft: {
			...structuredClone(draft),
			...rules,
			locks: locks.locks,
			forbidden: forbidden.list,
			alike: alike.list,
			apart: apart.list,
			groups: groups.list,
			layout: { ...layout.layout, lettering: names.lettering },
		},
		rows: [locks, forbidden, alike, apart, groups, struck, added, layout, names].flatMap(
			({ rows }) => rows,
		),
	};
}

function carryForbidden(ground: CarryGround, draft: Draft) {
	const seen = new Set<string>();
	const list: Draft['forbidden'] = [];
	const rows = draft.forbidden.map(({ key, ink, ...mark }) => {
		const subject = `That ${quoted(key)} may not be ${inkName(draft, ink)}`;
		const carrying = { what: 'forbidden', keys: [key], subject };
		const now = ground.heirsOf(key).map(ground.key);
		if (now.length === 0) return carriedRow(carrying, 'dropped', [], 'the region is gone');
		const isNew = now.filter(
			(heir) => seen.size < seen.add(`${ink} ${mark.tie ?? ''} ${heir}`).size,
		);
		for (const heir of isNew) list.push({ key: heir, ink, ...mark });
		const outcome = isNew.length === 0 ? 'doubled' : now.length > 1 ? 'copied' : 'followed';
		return carriedRow(carrying, outcome, now);
	});
	return { list, rows };
}

function carryRules(
	ground: CarryGround,
	rules: [string, string][],
	what: 'alike' | 'apart',
	choose: Choose,
) {
	const said = (keys: readonly string[]): Carrying => ({
		what,
		keys: [...keys],
		subject: `That ${quoted(keys[0])} and ${quoted(keys[1])} are kept ${what}`,
	});
	const { pairs, rows } = carryPairs(ground, rules, (rule) => rule, said, choose);
	return { list: pairs.map(({ a, b }): [string, string] => [a, b]), rows };
}

/** Pieces of either region that need not differ, the largest of both first. */
function alikePairs(
	{ key }: CarryGround,
	apart: [string, string][],
	mustDiffer: PairTest | null,
): Choose {
	const isApart = new Set(apart.flatMap(([a, b]) => [`${a}\n${b}`, `${b}\n${a}`]));
	return (a, b, isPlain) => {
		const all = everyPair(a, b);
		if (isPlain || typeof all === 'string') return all;
		const kept = new Set(apartFrom([a[0], b[0], ...a.slice(1), ...b.slice(1)], mustDiffer));
		const pairs = all.filter(([one, other]) => kept.has(one) && kept.has(other));
		const allowed = pairs.filter(([one, other]) => !isApart.has(`${key(one)}\n${key(other)}`));
		if (pairs.length === 0) return 'they touch now';
		return allowed.length > 0 ? allowed : 'they are kept apart as well';
	};
}

function carryHandBorders(
	ground: CarryGround,
	borders: Draft['struck'],
	what: 'struck' | 'added',
	hasBorder: PairTest | null,
) {
	const choose: Choose = (a, b) => {
		const all = everyPair(a, b);
		if (typeof all === 'string' || !hasBorder) return all;
		const real = all.filter(([one, other]) => hasBorder(one, other));
		return real.length > 0 ? real : 'there is no such border now';
	};
	const said = ({ a, b }: Draft['struck'][number]): Carrying => ({
		what,
		keys: [a, b],
		subject: `The border of ${quoted(a)} and ${quoted(b)}, ${what} by hand,`,
	});
	const { pairs, rows } = carryPairs(ground, borders, ({ a, b }) => [a, b], said, choose);
	return { list: pairs.map(({ rule, a, b }) => ({ ...rule, a, b })), rows };
}

function carryLayout(layout: Draft['layout'], columns: readonly string[] | undefined) {
	const copy = structuredClone(layout);
	const isGone = (column: string | null): column is string =>
		column !== null && columns !== undefined && !columns.includes(column);
	const rows: CarriedRow[] = [];
	const drop = (subject: string) =>
		rows.push(
			carriedRow(
				{ what: 'layout', keys: [], subject },
				'dropped',
				[],
				'the new file has no such column',
			),
		);
	const { groupColumn } = layout;
	const { nameColumn } = layout.lettering;
	if (isGone(groupColumn)) {
		drop(`The layout's grouping by the column ${quoted(groupColumn)}`);
		copy.groupColumn = null;
	}
	if (isGone(nameColumn)) {
		drop(`That names are taken from the column ${quoted(nameColumn)}`);
		copy.lettering.nameColumn = null;
	}
	return { layout: copy, rows };
}
