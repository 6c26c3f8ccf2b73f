import type { ExtraColumn } from './source.ts';

/** The territory of every region, where a sheet has territories. In: key and name a region, or null. */
export function territoryColumns(
	territories: readonly ({ key: string; name: string } | null)[],
): ExtraColumn[] {
	const of = (pick: 'key' | 'name') => territories.map((one) => one?.[pick] ?? null);
	return [
		{ id: 'territory', heading: 'territory', kind: 'text', values: of('key') },
		{ id: 'territoryName', heading: 'territory name', kind: 'text', values: of('name') },
	];
}
