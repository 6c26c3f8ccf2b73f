import { bordersForSheet, type BorderList } from '../engines/borders/index.ts';
import type { ColouringProblem } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { RegionNumbers } from './rules-in-force';

/** The parts of a draft that a colouring depends on; layout and the look of inks are not among them. */
export const colouringParts = (draft: Draft): readonly unknown[] => [
	draft.inks,
	draft.locks,
	draft.forbidden,
	draft.alike,
	draft.apart,
	draft.groups,
	draft.reserved,
	draft.pointTouches,
	draft.leastMetres,
	draft.waterKm,
	draft.struck,
	draft.added,
	draft.seed,
];

/**
 * What is asked of the colouring engine for this draft, staying as near as can be to `previous`. The
 * server asks the very same when the draft is saved, and so gets the same answer.
 */
export function problemOf(
	draft: Draft,
	keys: string[],
	borders: BorderList,
	numbers: RegionNumbers,
	previous: Int32Array | null,
): ColouringProblem {
	return {
		regions: keys.length,
		borders: bordersForSheet(keys, borders, draft),
		inks: draft.inks,
		...lockColumns(draft, numbers),
		forbidden: draft.forbidden.flatMap(({ key, ink }) => {
			const region = numbers.get(key);
			return region === undefined ? [] : [[region, ink] as const];
		}),
		alike: draft.alike.flatMap(([a, b]) => pairOf(a, b, numbers)),
		apart: draft.apart.flatMap(([a, b]) => pairOf(a, b, numbers)),
		seed: draft.seed,
		...(previous ? { previous, goal: 'fewest-changes' as const } : {}),
	};
}

/** Ink of each locked region, -1 for free, and what dropping each lock would cost. */
function lockColumns(draft: Draft, numbers: RegionNumbers) {
	const locks = new Int32Array(numbers.size).fill(-1);
	const lockCosts = new Float64Array(numbers.size).fill(1);
	for (const [key, { ink, cost }] of Object.entries(draft.locks)) {
		const region = numbers.get(key);
		if (region === undefined) continue;
		locks[region] = ink;
		lockCosts[region] = cost;
	}
	return { locks, lockCosts };
}

function pairOf(a: string, b: string, numbers: RegionNumbers): [number, number][] {
	const [one, other] = [numbers.get(a), numbers.get(b)];
	return one === undefined || other === undefined ? [] : [[one, other]];
}
