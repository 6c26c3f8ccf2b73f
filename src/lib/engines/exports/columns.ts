import type { SheetTheme } from '../sheet/index.ts';
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

/** The class of every region on a themed map, from 1 as in the legend, and its range in words. */
export function themeColumns({ classes, inks, title }: SheetTheme): ExtraColumn[] {
	const list = [...classes];
	return [
		{
			...{ id: 'themeClass', heading: 'class', kind: 'number' },
			values: list.map((one) => (one < 0 ? null : one + 1)),
		},
		{
			...{ id: 'themeRange', heading: title || 'range', kind: 'text' },
			values: list.map((one) => inks[one]?.name ?? null),
		},
	];
}
