import { mostDifferent, type Draft, type GroupRule } from '$lib/engines/editions/draft';
import type { RuleEntry } from '$lib/engines/editions/rule-list';
import { ruleLimits } from '$lib/engines/editions/rule-limits';

/** What people do to the rules of a draft, each a new draft; the old one is never touched. */

type Edit = (draft: Draft) => Draft;
export type PairKind = 'alike' | 'apart';

/** Forbids an ink for these regions, or allows it again; what an adjoining sheet asks for stays. */
export const forbid =
	(keys: readonly string[], ink: number, on: boolean): Edit =>
	(draft) => {
		const named = new Set(keys);
		const others = draft.forbidden.filter(
			(rule) => rule.tie !== undefined || rule.ink !== ink || !named.has(rule.key),
		);
		const put = on ? keys.map((key) => ({ key, ink })) : [];
		return { ...draft, forbidden: [...others, ...put] };
	};

/** Keeps two regions alike, or apart; the contrary rule about the same two goes. */
export const keepPair =
	(kind: PairKind, a: string, b: string): Edit =>
	(draft) => {
		const isOther = ([p, q]: readonly [string, string]) =>
			!((p === a && q === b) || (p === b && q === a));
		const pairs = { alike: draft.alike.filter(isOther), apart: draft.apart.filter(isOther) };
		pairs[kind].push([a, b]);
		return { ...draft, ...pairs };
	};

/** Puts groups in; one of the same kind and name is replaced. */
export const putGroups =
	(groups: readonly GroupRule[]): Edit =>
	(draft) => {
		const named = new Set(groups.map(groupName));
		const others = draft.groups.filter((group) => !named.has(groupName(group)));
		return { ...draft, groups: [...others, ...groups] };
	};

const groupName = ({ kind, name }: GroupRule) => `${kind} ${name}`;

/** "Group 3": the first such name that no group has. */
export function freshGroupName({ groups }: Pick<Draft, 'groups'>): string {
	const taken = new Set(groups.map(({ name }) => name));
	let number = 1;
	while (taken.has(`Group ${number}`)) number++;
	return `Group ${number}`;
}

/** Why so many regions cannot be a group of this kind; '' when they can. */
export function groupFault(kind: GroupRule['kind'], regions: number): string {
	if (regions < 2) return 'A group needs two regions or more.';
	if (kind === 'different' && regions > mostDifferent) {
		return `At most ${mostDifferent} regions can all be kept different; more could not be told apart.`;
	}
	if (regions > ruleLimits.rules) return `A group takes ${ruleLimits.rules} regions at most.`;
	return '';
}

/** Reserves an ink for those locked to it, or lets all regions have it again. */
export const reserve =
	(ink: number, on: boolean): Edit =>
	(draft) => {
		const others = draft.reserved.filter((other) => other !== ink);
		return { ...draft, reserved: on ? [...others, ink].sort((a, b) => a - b) : others };
	};

/** Locks regions to the inks they have now; those without one are passed over. */
export const lockAsShown =
	(shown: readonly (readonly [key: string, ink: number])[], by?: string): Edit =>
	(draft) => {
		const at = new Date().toISOString().slice(0, 10);
		const known = new Map(Object.entries(draft.locks));
		for (const [key, ink] of shown) {
			const old = known.get(key);
			if (ink < 0 || old?.ink === ink) continue;
			known.set(key, { ink, cost: old?.cost ?? 1, ...(by ? { by } : {}), at });
		}
		return { ...draft, locks: Object.fromEntries(known) };
	};

/** The same weight for every lock on these regions. */
export const weighAll =
	(keys: readonly string[], cost: number): Edit =>
	(draft) => {
		const named = new Set(keys);
		const locks = Object.entries(draft.locks).map(
			([key, lock]) => [key, named.has(key) ? { ...lock, cost } : lock] as const,
		);
		return { ...draft, locks: Object.fromEntries(locks) };
	};

/** Drops rules of the list one after the other. */
export const dropRules =
	(rules: readonly Pick<RuleEntry, 'drop'>[]): Edit =>
	(draft) =>
		rules.reduce((left, { drop }) => drop(left), draft);
