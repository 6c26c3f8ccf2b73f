import { borderKinds, type BorderList } from '../engines/borders/border-list.ts';
import { buildGraph, type RegionGraph } from '../engines/graph/index.ts';
import type { Territory } from '../engines/territories/problem.ts';
import type { TerritoryDraft, TerritoryEntry } from '../engines/territories/territory-draft.ts';
import type { RegionNumbers } from './rules-in-force';

/** What people decided about territories, in the numbers that the engines count with. */

const line = borderKinds.indexOf('line');

export const numberTerritories = (
	entries: readonly TerritoryEntry[],
): ReadonlyMap<string, number> => new Map(entries.map(({ key }, number) => [key, number]));

/** Territory number of every region, -1 for none; keys that no longer exist are passed over. */
export function assignmentOf(
	assignment: TerritoryDraft['assignment'],
	keys: readonly string[],
	territories: ReadonlyMap<string, number>,
): Int32Array {
	return Int32Array.from(keys, (key) => territories.get(assignment[key]) ?? -1);
}

/** Which regions count as joined: by a line border, a water link that was chosen, a link made by hand. */
export function joinedRegions(
	borders: Pick<BorderList, 'a' | 'b' | 'kind'>,
	numbers: RegionNumbers,
	waterLinks: TerritoryDraft['waterLinks'],
	handLinks: TerritoryDraft['handLinks'],
): RegionGraph {
	const a: number[] = [];
	const b: number[] = [];
	for (let border = 0; border < borders.a.length; border++) {
		if (borders.kind[border] !== line) continue;
		a.push(borders.a[border]);
		b.push(borders.b[border]);
	}
	const linked = [...waterLinks, ...handLinks.map((link) => [link.a, link.b] as const)];
	for (const [one, other] of linked) {
		const [from, to] = [numbers.get(one), numbers.get(other)];
		if (from === undefined || to === undefined || from === to) continue;
		a.push(from);
		b.push(to);
	}
	return buildGraph(numbers.size, a, b);
}

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
