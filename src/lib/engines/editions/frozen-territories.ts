import type { TerritoryDraft } from '../territories/territory-draft.ts';

/**
 * Which territory every region was in when an edition was issued. Who serves a territory, where letters
 * go, and what binds it are no part of it.
 */
export interface FrozenTerritories {
	/** territory key -> name, of those that have a region */
	names: Record<string, string>;
	/** region key -> territory key; a region that is not named has none */
	regions: Record<string, string>;
}

/** A region's territory as files tell it; null where it has none. */
export type RegionTerritory = { key: string; name: string } | null;

/**
 * In: the region keys of a sheet, its territories. Out: the part of them that files tell, null where no
 * region of the sheet is in a territory of the list.
 */
export function freezeTerritories(
	keys: readonly string[],
	{
		territories,
		assignment,
	}: Pick<TerritoryDraft, 'assignment'> & {
		territories: readonly Pick<TerritoryDraft['territories'][number], 'key' | 'name'>[];
	},
): FrozenTerritories | null {
	const known = new Map(territories.map(({ key, name }) => [key, name]));
	const regions = keys.flatMap((key) => {
		const territory = Object.hasOwn(assignment, key) ? assignment[key] : undefined;
		return territory !== undefined && known.has(territory) ? [[key, territory] as const] : [];
	});
	if (regions.length === 0) return null;
	const used = new Set(regions.map(([, territory]) => territory));
	return {
		names: Object.fromEntries([...known].filter(([key]) => used.has(key))),
		regions: Object.fromEntries(regions),
	};
}

/** Back, in the order of these keys. */
export const thawTerritories = (
	keys: readonly string[],
	{ names, regions }: FrozenTerritories,
): RegionTerritory[] =>
	keys.map((region) => {
		const key = Object.hasOwn(regions, region) ? regions[region] : undefined;
		return key === undefined ? null : { key, name: names[key] };
	});
