import { borderKinds, type BorderList } from '../engines/borders/border-list.ts';
import type { ColouringProblem, ColouringResult } from '$lib/engines/colouring/problem';

/** The borders between territories: one entry a pair, a < b, with the metres they share. */
export function territoryBorders(
	borders: BorderList,
	assignment: Int32Array,
	territories: number,
): BorderList {
	const metres = new Map<number, number>();
	for (let border = 0; border < borders.a.length; border++) {
		const one = assignment[borders.a[border]];
		const other = assignment[borders.b[border]];
		if (one === other || one < 0 || other < 0) continue;
		const pair = Math.min(one, other) * territories + Math.max(one, other);
		metres.set(pair, (metres.get(pair) ?? 0) + borders.metres[border]);
	}
	const pairs = [...metres.keys()].sort((p, q) => p - q);
	return {
		a: Uint32Array.from(pairs, (pair) => Math.floor(pair / territories)),
		b: Uint32Array.from(pairs, (pair) => pair % territories),
		kind: new Uint8Array(pairs.length).fill(borderKinds.indexOf('line')),
		metres: Float64Array.from(pairs, (pair) => metres.get(pair) ?? 0),
		at: new Float64Array(2 * pairs.length),
	};
}

/** First question to the colouring engine, the same as the server's: the least number of inks that does. */
export const fewestInks = (territories: number, { a, b }: BorderList): ColouringProblem => ({
	regions: territories,
	borders: { a: [...a], b: [...b] },
	inks: 'fewest',
	seed: 0,
});

/**
 * Second question: in as many inks, or as many as the territories had before where that is more, the
 * fewest territories change theirs. A text where the palette's `most` inks do not do.
 */
export function fewestChanges(
	plain: ColouringProblem,
	fewest: ColouringResult,
	previous: Int32Array,
	most: number,
): ColouringProblem | string {
	if (fewest.status !== 'coloured')
		return `The palette’s ${most} inks do not tell the territories apart.`;
	if (fewest.inksUsed > most)
		return `The territories need ${fewest.inksUsed} inks and the palette has ${most}.`;
	const kept = previous.map((ink) => (ink < most ? ink : -1));
	const inks = Math.max(fewest.inksUsed, ...kept.map((ink) => ink + 1));
	return { ...plain, inks, previous: kept, goal: 'fewest-changes' };
}

/** Ink of each territory by number, -1 for none yet. */
export const inksByNumber = (
	keys: readonly string[],
	inks: Readonly<Record<string, number>>,
): Int32Array => Int32Array.from(keys, (key) => (Object.hasOwn(inks, key) ? inks[key] : -1));

/** The same colouring question needs no second answer. */
export const sameBorders = (one: BorderList | null, other: BorderList): boolean =>
	one !== null &&
	one.a.length === other.a.length &&
	one.a.every((a, i) => a === other.a[i] && one.b[i] === other.b[i]);
