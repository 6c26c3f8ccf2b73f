import {
	dropForbidden,
	dropGroup,
	dropLock,
	dropPair,
	dropReserved,
	type DropRule,
} from './drop-rule.ts';
import type { Draft, ForbiddenInk, GroupRule, Lock } from './draft.ts';
import type { RuleParts } from './rule-parts.ts';

export const ruleKinds = [
	'lock',
	'forbidden ink',
	'keep alike',
	'keep apart',
	'all alike',
	'all different',
	'reserved ink',
] as const;
export type RuleKind = (typeof ruleKinds)[number];

/** A rule of a draft about its inks, whichever list of the draft it stands in. */
export interface RuleEntry {
	/** no other rule of the draft has it; the same rule has the same in another draft */
	id: string;
	kind: RuleKind;
	/** regions it is about, by key; none for a reserved ink */
	keys: readonly string[];
	/** number from 0 */
	ink: number | null;
	/** of a lock: what dropping it costs */
	weight: number | null;
	/** name of the group */
	group: string | null;
	/** number of the adjoining sheet that asks for it */
	tie: number | null;
	by: string | null;
	at: string | null;
	/** the draft without it */
	drop: DropRule;
}

const unsaid = { ink: null, weight: null, group: null, tie: null, by: null, at: null };
const idOf = (...parts: unknown[]) => JSON.stringify(parts);

/**
 * Every rule of a draft about its inks as one list: locks, forbidden inks, pairs and groups, reserved
 * inks, each kind in the order of the draft. A rule that stands there twice is listed once. Borders
 * decided by hand are another list. Linear time.
 */
export const ruleList = (draft: Draft): RuleEntry[] => entriesOf(draft);

/** Those of the list that name one region, without making the others. Linear time. */
export function rulesAbout(draft: Draft, key: string): RuleEntry[] {
	const names = (keys: readonly string[]) => keys.includes(key);
	return entriesOf({
		locks: Object.hasOwn(draft.locks, key) ? { [key]: draft.locks[key] } : {},
		forbidden: draft.forbidden.filter((rule) => rule.key === key),
		alike: draft.alike.filter(names),
		apart: draft.apart.filter(names),
		groups: draft.groups.filter(({ keys }) => names(keys)),
		reserved: [],
	});
}

/** How many rules of each kind a draft has; one that stands there twice counts twice. */
export const ruleCounts = (draft: RuleParts): Record<RuleKind, number> => ({
	lock: Object.keys(draft.locks).length,
	'forbidden ink': draft.forbidden.length,
	'keep alike': draft.alike.length,
	'keep apart': draft.apart.length,
	'all alike': draft.groups.filter(({ kind }) => kind === 'alike').length,
	'all different': draft.groups.filter(({ kind }) => kind === 'different').length,
	'reserved ink': draft.reserved.length,
});

function entriesOf(draft: RuleParts): RuleEntry[] {
	const entries = [
		...Object.entries(draft.locks).map(lockEntry),
		...draft.forbidden.map(forbiddenEntry),
		...draft.alike.map((pair) => pairEntry('alike', pair)),
		...draft.apart.map((pair) => pairEntry('apart', pair)),
		...draft.groups.map(groupEntry),
		...draft.reserved.map(reservedEntry),
	];
	const seen = new Set<string>();
	return entries.filter(({ id }) => !seen.has(id) && seen.add(id));
}

const lockEntry = ([key, { ink, cost, tie, by, at }]: [string, Lock]): RuleEntry => ({
	...{ ...unsaid, id: idOf('lock', key), kind: 'lock', keys: [key], ink, weight: cost },
	...{ tie: tie ?? null, by: by ?? null, at: at ?? null, drop: dropLock(key) },
});

const forbiddenEntry = ({ key, ink, tie }: ForbiddenInk): RuleEntry => ({
	...{ ...unsaid, id: idOf('forbidden', key, ink, tie ?? null), kind: 'forbidden ink' },
	...{ keys: [key], ink, tie: tie ?? null, drop: dropForbidden(key, ink, tie) },
});

const pairEntry = (kind: 'alike' | 'apart', [a, b]: readonly [string, string]): RuleEntry => ({
	...{ ...unsaid, id: idOf(kind, ...[a, b].sort()), keys: [a, b] },
	...{ kind: kind === 'alike' ? 'keep alike' : 'keep apart', drop: dropPair(kind, a, b) },
});

const groupEntry = ({ kind, name, keys }: GroupRule): RuleEntry => ({
	...{ ...unsaid, id: idOf('group', kind, name), keys, group: name },
	...{ kind: kind === 'alike' ? 'all alike' : 'all different', drop: dropGroup(kind, name) },
});

const reservedEntry = (ink: number): RuleEntry => ({
	...{ ...unsaid, id: idOf('reserved', ink), kind: 'reserved ink', keys: [], ink },
	drop: dropReserved(ink),
});
