import type { Territory } from '$lib/engines/territories/problem';
import type { TerritoryEntry } from '$lib/engines/territories/territory-draft';
import type { RegionNumbers } from './rules-in-force';

/** Territory numbers by key, in the order of the list. */
export const numberTerritories = (
	entries: readonly TerritoryEntry[],
): ReadonlyMap<string, number> => new Map(entries.map(({ key }, number) => [key, number]));

/** The list as the engine counts it; a base that the sheet does not have is none. */
export const asTerritories = (
	entries: readonly TerritoryEntry[],
	numbers: RegionNumbers,
): Territory[] =>
	entries.map(({ base, capacity, frozen, closing }) => ({
		base: base === null ? -1 : (numbers.get(base) ?? -1),
		capacity,
		frozen,
		closing,
	}));
