import type { BorderList } from '$lib/engines/borders/border-list';
import type { ColouringProblem } from '$lib/engines/colouring/problem';
import type { Standing } from './rules-in-force';

/** The borders between territories: one entry a pair, with the metres they share. */
export function territoryBorders(
	borders: BorderList,
	standing: readonly Standing[],
	assignment: Int32Array,
	territories: number,
): BorderList {
	const metres = new Map<number, number>();
	for (let border = 0; border < borders.a.length; border++) {
		const one = assignment[borders.a[border]];
		const other = assignment[borders.b[border]];
		if (one === other || one < 0 || other < 0 || standing[border] !== 'counts') continue;
		const pair = Math.min(one, other) * territories + Math.max(one, other);
		metres.set(pair, (metres.get(pair) ?? 0) + borders.metres[border]);
	}
	const pairs = [...metres.keys()].sort((p, q) => p - q);
	return {
		a: Uint32Array.from(pairs, (pair) => Math.floor(pair / territories)),
		b: Uint32Array.from(pairs, (pair) => pair % territories),
		kind: new Uint8Array(pairs.length),
		metres: Float64Array.from(pairs, (pair) => metres.get(pair) ?? 0),
		at: new Float64Array(2 * pairs.length),
	};
}

/** What the colouring engine is asked: neighbouring territories differ, and as few as can be change. */
export const territoryColouring = (
	territories: number,
	borders: BorderList,
	previous: Int32Array,
): ColouringProblem => ({
	regions: territories,
	borders,
	inks: 'fewest',
	previous,
	goal: 'fewest-changes',
	seed: 1,
});

/** Ink of each territory by number, -1 for none yet. */
export const inksByNumber = (
	keys: readonly string[],
	inks: Readonly<Record<string, number>>,
): Int32Array => Int32Array.from(keys, (key) => inks[key] ?? -1);

/** The same colouring question needs no second answer. */
export const sameBorders = (one: BorderList | null, other: BorderList): boolean =>
	one !== null &&
	one.a.length === other.a.length &&
	one.a.every((a, i) => a === other.a[i] && one.b[i] === other.b[i]);
