import type { SheetRow } from '../sheet/index.ts';
import type { ExtraColumn } from './source.ts';

/**
 * Class and range of every region of a themed sheet, as columns of its files; none of a sheet that shows its
 * colouring. Files go to everybody who may take them, so figures are no part of them.
 */
export function themeExtraColumns(rows: readonly SheetRow[]): ExtraColumn[] {
	if (!rows.some(({ theme }) => theme)) return [];
	const values = <T extends string | number | null>(of: (row: SheetRow) => T) => {
		const list: (T | null)[] = rows.map(() => null);
		for (const row of rows) list[row.region] = of(row);
		return list;
	};
	return [
		{
			...{ id: 'class', heading: 'class', kind: 'number' },
			values: values(({ theme }) => theme?.class ?? null),
		},
		{
			...{ id: 'range', heading: 'range', kind: 'text' },
			values: values(({ theme }) => theme?.range ?? null),
		},
	];
}
