import { isDeepStrictEqual } from 'node:util';
import type { Draft } from '../../engines/editions/draft.ts';
import type { Action } from '../access/roles.ts';

/** The right that a change of each part of a draft needs. */
const rightFor: Record<keyof Draft, Action> = {
	inks: 'colours.edit',
	palette: 'palette.edit',
	locks: 'colours.edit',
	forbidden: 'colours.edit',
	alike: 'colours.edit',
	apart: 'colours.edit',
	pointTouches: 'borders.edit',
	leastMetres: 'borders.edit',
	waterKm: 'borders.edit',
	struck: 'borders.edit',
	added: 'borders.edit',
	seed: 'colours.edit',
	layout: 'layout.edit',
};

/** Parts the colouring depends on; the others change only how it looks. */
const colouringParts: readonly (keyof Draft)[] = [
	'inks',
	'locks',
	'forbidden',
	'alike',
	'apart',
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
 * The draft with every lock signed: one that stands as before keeps its name and date, whatever was sent;
 * a new or altered one gets these.
 */
export function signLocks(before: Draft, after: Draft, by: string, at: string): Draft {
	const locks = Object.entries(after.locks).map(([key, { ink, cost }]) => {
		const old = Object.hasOwn(before.locks, key) ? before.locks[key] : undefined;
		const same = old && old.ink === ink && old.cost === cost;
		return [key, same ? old : { ink, cost, by, at }] as const;
	});
	return { ...after, locks: Object.fromEntries(locks) };
}
