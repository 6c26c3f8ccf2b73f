import { bordersForSheet, type BorderList } from '../borders/index.ts';
import type { ColouringProblem } from '../colouring/problem.ts';
import type { Draft } from './draft.ts';
import { groupPairs, type NumberedPair } from './group-pairs.ts';

/** The regions and borders a draft is about. */
export interface RuleGround {
	keys: readonly string[];
	borders: BorderList;
}

/** What a caller may know already, and what the answer is to stay near to. */
export interface ProblemOptions {
	/** number of each region by key, where the caller keeps one */
	numbers?: ReadonlyMap<string, number>;
	/** ink of each region in the colouring before, -1 for none: as few as can be change */
	previous?: ArrayLike<number> | null;
}

/**
 * What the colouring engine is asked for by a draft: regions by number, rules for many regions at once
 * written out as pairs (`groupPairs`), borders as they count on the sheet. Browser and server both ask
 * through this function, so that the same seed gives the same answer. Rules about regions that the ground
 * does not have are left out; who must refuse them asks `strangersIn` first. Linear time.
 */
export function colouringProblem(
	ground: RuleGround,
	draft: Draft,
	{ numbers = numbersOf(ground.keys), previous = null }: ProblemOptions = {},
): ColouringProblem {
	const groups = groupPairs(draft.groups, numbers);
	return {
		regions: ground.keys.length,
		borders: bordersForSheet(ground.keys, ground.borders, draft),
		inks: draft.inks,
		...lockColumns(ground.keys.length, draft, numbers),
		forbidden: draft.forbidden.flatMap(({ key, ink }) => {
			const region = numbers.get(key);
			return region === undefined ? [] : [[region, ink] as const];
		}),
		reserved: [...draft.reserved],
		alike: [...pairsOf(draft.alike, numbers), ...groups.alike],
		apart: [...pairsOf(draft.apart, numbers), ...groups.apart],
		seed: draft.seed,
		...(previous ? { previous: Int32Array.from(previous), goal: 'fewest-changes' } : {}),
	};
}

const numbersOf = (keys: readonly string[]) => new Map(keys.map((key, number) => [key, number]));

/** Keys that a draft names and the ground does not have, each once, in the order of the draft. */
export function strangersIn(keys: Iterable<string>, draft: Draft): string[] {
	const known = new Set(keys);
	const strangers = new Set<string>();
	for (const key of keysIn(draft)) if (!known.has(key)) strangers.add(key);
	return [...strangers];
}

function* keysIn(draft: Draft): Generator<string> {
	yield* Object.keys(draft.locks);
	for (const { key } of draft.forbidden) yield key;
	for (const pair of draft.alike) yield* pair;
	for (const pair of draft.apart) yield* pair;
	for (const { keys } of draft.groups) yield* keys;
	for (const { a, b } of draft.struck) yield* [a, b];
	for (const { a, b } of draft.added) yield* [a, b];
}

/** Ink of each locked region, -1 for free, and what dropping each lock would cost. */
function lockColumns(regions: number, draft: Draft, numbers: ReadonlyMap<string, number>) {
	const locks = new Int32Array(regions).fill(-1);
	const lockCosts = new Float64Array(regions).fill(1);
	for (const [key, { ink, cost }] of Object.entries(draft.locks)) {
		const region = numbers.get(key);
		if (region === undefined) continue;
		locks[region] = ink;
		lockCosts[region] = cost;
	}
	return { locks, lockCosts };
}

function pairsOf(
	pairs: readonly [string, string][],
	numbers: ReadonlyMap<string, number>,
): NumberedPair[] {
	return pairs.flatMap(([a, b]) => {
		const [one, other] = [numbers.get(a), numbers.get(b)];
		return one === undefined || other === undefined ? [] : [[one, other] as const];
	});
}
