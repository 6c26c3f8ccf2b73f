import type { BorderList } from '$lib/engines/borders/border-list';
import type { ColouringProblem } from '$lib/engines/colouring/problem';
import type { Draft } from '$lib/engines/editions/draft';
import type { RegionNumbers, Standing } from './rules-in-force';

/** The parts of a draft that a colouring depends on; layout and the look of inks are not among them. */
export const colouringParts = (draft: Draft): readonly unknown[] => [
	draft.inks,
	draft.locks,
	draft.forbidden,
	draft.alike,
	draft.apart,
	draft.pointTouches,
	draft.struck,
	draft.added,
	draft.seed,
];

/** What is asked of the colouring engine for this draft, staying as near as can be to `previous`. */
export function problemOf(
	draft: Draft,
	borders: BorderList,
	standing: readonly Standing[],
	numbers: RegionNumbers,
	previous: Int32Array | null,
): ColouringProblem {
	const pairs = [
		...countingPairs(borders, standing),
		...draft.added.flatMap(({ a, b }) => pairOf(a, b, numbers)),
	];
	return {
		regions: numbers.size,
		borders: { a: Uint32Array.from(pairs, ([a]) => a), b: Uint32Array.from(pairs, ([, b]) => b) },
		inks: draft.inks,
		locks: lockArray(draft, numbers),
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

/** Ink of each locked region, -1 for free. */
export function lockArray(draft: Draft, numbers: RegionNumbers): Int32Array {
	const locks = new Int32Array(numbers.size).fill(-1);
	for (const [key, { ink }] of Object.entries(draft.locks)) {
		const region = numbers.get(key);
		if (region !== undefined) locks[region] = ink;
	}
	return locks;
}

function* countingPairs(borders: BorderList, standing: readonly Standing[]) {
	for (let border = 0; border < standing.length; border++)
		if (standing[border] === 'counts') yield [borders.a[border], borders.b[border]] as const;
}

function pairOf(a: string, b: string, numbers: RegionNumbers): [number, number][] {
	const [one, other] = [numbers.get(a), numbers.get(b)];
	return one === undefined || other === undefined ? [] : [[one, other]];
}
