import { isDeepStrictEqual } from 'node:util';
import type { Draft, EdgeTie, HandBorder } from '../../engines/editions/draft.ts';
import type { Action } from '../access/roles.ts';

/** The right that a change of each part of a draft needs. */
const rightFor: Record<keyof Draft, Action> = {
	inks: 'colours.edit',
	palette: 'palette.edit',
	locks: 'colours.edit',
	forbidden: 'colours.edit',
	alike: 'colours.edit',
	apart: 'colours.edit',
	groups: 'colours.edit',
	reserved: 'colours.edit',
	goals: 'colours.edit',
	ties: 'colours.edit',
	pointTouches: 'borders.edit',
	leastMetres: 'borders.edit',
	waterKm: 'borders.edit',
	struck: 'borders.edit',
	added: 'borders.edit',
	seed: 'colours.edit',
	layout: 'layout.edit',
	theme: 'theme.edit',
};

/** Parts the colouring depends on; the others change only how it looks. */
export const colouringParts: readonly (keyof Draft)[] = [
	'inks',
	'locks',
	'forbidden',
	'alike',
	'apart',
	'groups',
	'reserved',
	'pointTouches',
	'leastMetres',
	'waterKm',
	'struck',
	'added',
	'seed',
];

export function changedParts(before: Draft, after: Draft): (keyof Draft)[] {
	const parts = Object.keys(rightFor) as (keyof Draft)[];
	return parts.filter((part) => !isDeepStrictEqual(before[part], after[part]));
}

export const rightsFor = (parts: readonly (keyof Draft)[]): Action[] => [
	...new Set(parts.map((part) => rightFor[part])),
];

export const changesColouring = (parts: readonly (keyof Draft)[]): boolean =>
	parts.some((part) => colouringParts.includes(part));

/**
 * The draft with every lock, every tie and every border decided by hand signed: one that stands as before keeps its
 * name and date, whatever was sent; a new or altered one gets these.
 */
export function signDraft(before: Draft, after: Draft, by: string, at: string): Draft {
	return {
		...after,
		locks: signLocks(before, after, by, at),
		ties: signTies(before.ties, after.ties, by, at),
		struck: signBorders(before.struck, after.struck, by, at),
		added: signBorders(before.added, after.added, by, at),
	};
}

function signLocks(before: Draft, after: Draft, by: string, at: string): Draft['locks'] {
	const locks = Object.entries(after.locks).map(([key, { ink, cost, tie }]) => {
		const old = Object.hasOwn(before.locks, key) ? before.locks[key] : undefined;
		const same = old && old.ink === ink && old.cost === cost && old.tie === tie;
		return [key, same ? old : { ink, cost, by, at, ...(tie !== undefined && { tie }) }] as const;
	});
	return Object.fromEntries(locks);
}

function signTies(before: EdgeTie[], after: EdgeTie[], by: string, at: string): EdgeTie[] {
	const unsigned = ({ sheet, name, edition, revision }: EdgeTie) => ({
		...{ sheet, name, edition, revision },
	});
	return after.map((tie) => {
		const plain = unsigned(tie);
		const old = before.find((one) => isDeepStrictEqual(unsigned(one), plain));
		return old ?? { ...plain, by, at };
	});
}

function signBorders(before: HandBorder[], after: HandBorder[], by: string, at: string) {
	const name = ({ a, b, reason }: HandBorder) => JSON.stringify([a, b, reason]);
	const known = new Map(before.map((border) => [name(border), border]));
	return after.map((border) => {
		const { a, b, reason } = border;
		return known.get(name(border)) ?? { a, b, reason, by, at };
	});
}
