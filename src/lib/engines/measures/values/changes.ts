import { sumOf } from './sum.ts';

export interface ValueChange {
	region: number;
	from: number;
	to: number;
}

export interface ValueChanges {
	/** by region */
	changed: ValueChange[];
	/** regions that had no value and have one */
	added: { region: number; to: number }[];
	/** regions that had a value and have none */
	removed: { region: number; from: number }[];
	/** of `changed`, the one with the greatest difference; the earliest of equals */
	largest: ValueChange | null;
	totals: { before: number; after: number };
}

/**
 * What differs between two lists of values of the same regions, NaN where there is none. 0 and -0 are the
 * same. Throws RangeError where the lists differ in length.
 */
export function changesBetween(before: Float64Array, after: Float64Array): ValueChanges {
	if (before.length !== after.length) throw new RangeError('The lists are of different regions.');
	const changes: ValueChanges = {
		changed: [],
		added: [],
		removed: [],
		largest: null,
		totals: { before: sumOf(before), after: sumOf(after) },
	};
	before.forEach((from, region) => {
		const to = after[region];
		if (from === to || (Number.isNaN(from) && Number.isNaN(to))) return;
		if (Number.isNaN(from)) changes.added.push({ region, to });
		else if (Number.isNaN(to)) changes.removed.push({ region, from });
		else changes.changed.push({ region, from, to });
	});
	for (const change of changes.changed) {
		const largest = changes.largest;
		if (!largest || Math.abs(change.to - change.from) > Math.abs(largest.to - largest.from)) {
			changes.largest = change;
		}
	}
	return changes;
}
