import type { Draft, GroupRule } from './draft.ts';

/** The parts of a draft that a table of rules fills. */
export type RuleParts = Pick<
	Draft,
	'locks' | 'forbidden' | 'alike' | 'apart' | 'groups' | 'reserved'
>;

export const noRules = (): RuleParts => ({
	...{ locks: {}, forbidden: [], alike: [], apart: [], groups: [], reserved: [] },
});

/**
 * The draft with these rules in place of its own. What an adjoining sheet asks for stays, and of a region
 * that it locks the lock given is left out. A lock that says the same as before keeps who set it.
 */
export function replaceRules(draft: Draft, parts: RuleParts): Draft {
	const tied = Object.entries(draft.locks).filter(([, { tie }]) => tie !== undefined);
	return {
		...draft,
		...parts,
		locks: Object.fromEntries([...Object.entries(signedAsBefore(draft, parts)), ...tied]),
		forbidden: [...parts.forbidden, ...draft.forbidden.filter(({ tie }) => tie !== undefined)],
	};
}

/**
 * The draft with these rules beside its own. A lock given takes the place of one on the same region,
 * unless an adjoining sheet asks for that; a group of the same kind and name gets the regions added.
 */
export function addRules(draft: Draft, parts: RuleParts): Draft {
	const tied = Object.entries(draft.locks).filter(([, { tie }]) => tie !== undefined);
	const given = Object.entries(signedAsBefore(draft, parts));
	return {
		...draft,
		locks: Object.fromEntries([...Object.entries(draft.locks), ...given, ...tied]),
		forbidden: without([...draft.forbidden, ...parts.forbidden], ({ key, ink, tie }) =>
			JSON.stringify([key, ink, tie ?? null]),
		),
		alike: without([...draft.alike, ...parts.alike], pairName),
		apart: without([...draft.apart, ...parts.apart], pairName),
		groups: joinedGroups([...draft.groups, ...parts.groups]),
		reserved: [...new Set([...draft.reserved, ...parts.reserved])],
	};
}

function signedAsBefore(draft: Draft, { locks }: RuleParts): Draft['locks'] {
	const entries = Object.entries(locks).map(([key, lock]) => {
		const old = Object.hasOwn(draft.locks, key) ? draft.locks[key] : undefined;
		const same = old?.ink === lock.ink && old.cost === lock.cost;
		return [key, same ? old : lock] as const;
	});
	return Object.fromEntries(entries);
}

const pairName = ([a, b]: readonly [string, string]) => JSON.stringify(a < b ? [a, b] : [b, a]);

/** The first of those that have the same name. */
function without<T>(list: readonly T[], name: (entry: T) => string): T[] {
	const seen = new Set<string>();
	return list.filter((entry) => seen.size < seen.add(name(entry)).size);
}

function joinedGroups(groups: readonly GroupRule[]): GroupRule[] {
	const joined = new Map<string, GroupRule>();
	for (const group of groups) {
		const name = JSON.stringify([group.kind, group.name]);
		const keys = new Set([...(joined.get(name)?.keys ?? []), ...group.keys]);
		joined.set(name, { ...group, keys: [...keys] });
	}
	return [...joined.values()];
}
