import { heirsOf, type RegionMatch } from '../boundaries/recut/index.ts';

/** Values of a measure on the new regions. */
export interface CarriedValues<T> {
	/** by new region; null where there is none */
	values: (T | null)[];
	/** new regions that have the value of one old region, or one that all their parts agree on */
	carried: number;
	/** new regions that have the sum of several */
	summed: number;
	/** new regions without a value; of them, those that go on from a region which had one */
	empty: number;
	lost: number;
}

/**
 * Numbers by old region on the new regions. A region that goes on as one keeps its number; one merged from
 * several has their sum where the measure `addsUp` (a count, hours; not a rate) and every part has a
 * number; pieces of a split region, redrawn ones and new ones have none: nobody knows how a number is
 * spread over its region. In: null or NaN for no number. Throws RangeError for a list of another length.
 */
export function carryNumbers(
	values: readonly (number | null)[],
	match: RegionMatch,
	addsUp: boolean,
): CarriedValues<number> {
	const known = values.map((value) => (Number.isNaN(value) ? null : value));
	return carry(known, match, (parts) =>
		addsUp ? parts.reduce((sum, part) => sum + part, 0) : null,
	);
}

/**
 * Texts by old region on the new regions, in the same way; a merged region has a text where every part has
 * the same. Throws RangeError for a list of another length.
 */
export function carryTexts(
	texts: readonly (string | null)[],
	match: RegionMatch,
): CarriedValues<string> {
	return carry(texts, match, (parts) =>
		parts.every((part) => part === parts[0]) ? parts[0] : null,
	);
}

function carry<T extends number | string>(
	values: readonly (T | null)[],
	match: RegionMatch,
	together: (parts: T[]) => T | null,
): CarriedValues<T> {
	if (values.length !== match.before.keys.length) {
		throw new RangeError('The values are of other regions than the match.');
	}
	const { was, now } = heirsOf(match);
	const result: CarriedValues<T> = { values: [], carried: 0, summed: 0, empty: 0, lost: 0 };
	for (const olds of was) {
		const parts = olds.flatMap((old) => values[old] ?? []);
		const isWhole = parts.length === olds.length && olds.every((old) => now[old].length === 1);
		const value =
			!isWhole || olds.length === 0 ? null : olds.length > 1 ? together(parts) : parts[0];
		result.values.push(value);
		if (value !== null)
			result[typeof value === 'number' && olds.length > 1 ? 'summed' : 'carried']++;
		else result.empty++;
		if (value === null && parts.length > 0) result.lost++;
	}
	return result;
}
