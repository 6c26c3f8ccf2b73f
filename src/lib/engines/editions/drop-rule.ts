import type { Draft, GroupRule } from './draft.ts';

/** A draft without one of its rules. The draft given is not changed. */
export type DropRule = (draft: Draft) => Draft;

/** What stands beside a border that was struck out because the rules could not be kept with it. */
export const struckReason = 'So that the other rules can be kept';

const isPair = (a: string, b: string, p: string, q: string) =>
	(a === p && b === q) || (a === q && b === p);

export const dropLock =
	(key: string): DropRule =>
	(draft) => {
		if (!Object.hasOwn(draft.locks, key)) return draft;
		const kept = Object.entries(draft.locks).filter(([other]) => other !== key);
		return { ...draft, locks: Object.fromEntries(kept) };
	};

/** Only the entry with this tie; `undefined`: that which somebody set. */
export const dropForbidden =
	(key: string, ink: number, tie?: number): DropRule =>
	(draft) => {
		const forbidden = draft.forbidden.filter(
			(entry) => entry.key !== key || entry.ink !== ink || entry.tie !== tie,
		);
		return forbidden.length < draft.forbidden.length ? { ...draft, forbidden } : draft;
	};

export const dropPair =
	(kind: 'alike' | 'apart', p: string, q: string): DropRule =>
	(draft) => {
		const pairs = draft[kind].filter(([a, b]) => !isPair(a, b, p, q));
		return pairs.length < draft[kind].length ? { ...draft, [kind]: pairs } : draft;
	};

export const dropGroup =
	(kind: GroupRule['kind'], name: string): DropRule =>
	(draft) => {
		const groups = draft.groups.filter((group) => group.kind !== kind || group.name !== name);
		return groups.length < draft.groups.length ? { ...draft, groups } : draft;
	};

export const dropReserved =
	(ink: number): DropRule =>
	(draft) => {
		if (!draft.reserved.includes(ink)) return draft;
		return { ...draft, reserved: draft.reserved.filter((other) => other !== ink) };
	};

export const dropAdded =
	(p: string, q: string): DropRule =>
	(draft) => {
		const added = draft.added.filter(({ a, b }) => !isPair(a, b, p, q));
		return added.length < draft.added.length ? { ...draft, added } : draft;
	};

/** Strikes a border of the file out, so that the two regions may share an ink. */
export const strikeOut =
	(p: string, q: string): DropRule =>
	(draft) => {
		if (draft.struck.some(({ a, b }) => isPair(a, b, p, q))) return draft;
		const [a, b] = p < q ? [p, q] : [q, p];
		return { ...draft, struck: [...draft.struck, { a, b, reason: struckReason }] };
	};
