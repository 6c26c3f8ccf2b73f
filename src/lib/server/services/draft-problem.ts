import { bordersForSheet, type BorderList } from '../../engines/borders/index.ts';
import { problemFaults, type ColouringProblem } from '../../engines/colouring/index.ts';
import type { Draft } from '../../engines/editions/draft.ts';
import { Unfit } from './outcomes.ts';

/** The regions and borders a draft is about. */
export interface DraftGround {
	keys: string[];
	borders: BorderList;
}

/**
 * What the colouring engine is asked for by a draft, regions named by number instead of by key; with a
 * colouring before, as few regions as can be change their ink.
 * Throws `Unfit` when the draft names a region the boundary set does not have, or a rule that cannot be.
 */
export function problemOf(
	ground: DraftGround,
	draft: Draft,
	previous: ArrayLike<number> | null = null,
): ColouringProblem {
	const number = numbering(ground, draft);
	const pair = ([a, b]: readonly [string, string]) => [number(a), number(b)] as const;
	const problem: ColouringProblem = {
		regions: ground.keys.length,
		borders: sheetBorders(ground, draft),
		inks: draft.inks,
		...lockColumns(ground.keys.length, draft, number),
		forbidden: draft.forbidden.map(({ key, ink }) => [number(key), ink] as const),
		alike: draft.alike.map(pair),
		apart: draft.apart.map(pair),
		seed: draft.seed,
		...(previous ? { previous: Int32Array.from(previous), goal: 'fewest-changes' } : {}),
	};
	const faults = problemFaults(problem);
	if (faults.length > 0) throw new Unfit('unfit-rules', faults[0], { faults: faults.slice(0, 20) });
	return problem;
}

/** The borders that bind on a sheet: as found, without those struck out, with those added by hand. */
export const sheetBorders = ({ keys, borders }: DraftGround, draft: Draft): BorderList =>
	bordersForSheet(keys, borders, draft);

function numbering({ keys }: DraftGround, draft: Draft): (key: string) => number {
	const ordinal = new Map(keys.map((key, number) => [key, number]));
	const unknown = keysIn(draft).filter((key) => !ordinal.has(key));
	if (unknown.length > 0) {
		throw new Unfit('unknown-region', `the sheet has no region "${unknown[0]}"`, {
			regions: unknown.slice(0, 20),
		});
	}
	return (key) => ordinal.get(key) as number;
}

const keysIn = (draft: Draft): string[] => [
	...Object.keys(draft.locks),
	...draft.forbidden.map(({ key }) => key),
	...[...draft.alike, ...draft.apart].flat(),
	...[...draft.struck, ...draft.added].flatMap(({ a, b }) => [a, b]),
];

function lockColumns(regions: number, draft: Draft, number: (key: string) => number) {
	const locks = new Int32Array(regions).fill(-1);
	const lockCosts = new Float64Array(regions).fill(1);
	for (const [key, { ink, cost }] of Object.entries(draft.locks)) {
		locks[number(key)] = ink;
		lockCosts[number(key)] = cost;
	}
	return { locks, lockCosts };
}
