import type { SheetRow } from '../sheet/index.ts';
import type { ExtraColumn, FurtherValues } from './source.ts';

/** Class and range of every region of a themed sheet, as columns of its files; none of another sheet. */
export function themeExtraColumns(rows: readonly SheetRow[]): ExtraColumn[] {
	if (!rows.some(({ theme }) => theme)) return [];
	return [
		{
			...{ id: 'class', heading: 'class', kind: 'number' },
			values: byRegion(rows, ({ theme }) => theme?.class ?? null),
		},
		{
			...{ id: 'range', heading: 'range', kind: 'text' },
			values: byRegion(rows, ({ theme }) => theme?.range ?? null),
		},
	];
}

/**
 * The figures that were classed, headed by what they are. A region without a class (no data, suppressed)
 * has none here, whatever was handed in.
 */
export function figureColumn(
	rows: readonly SheetRow[],
	{ title, values }: NonNullable<FurtherValues['figures']>,
): ExtraColumn[] {
	if (!rows.some(({ theme }) => theme)) return [];
	return [
		{
			...{ id: 'value', heading: 'value', kind: 'number' },
			...(title && { unit: title }),
			values: byRegion(rows, ({ theme, region }) =>
				theme && theme.class !== null ? values[region] : null,
			),
		},
	];
}

function byRegion<T extends string | number | null>(
	rows: readonly SheetRow[],
	of: (row: SheetRow) => T,
): (T | null)[] {
	const list: (T | null)[] = rows.map(() => null);
	for (const row of rows) list[row.region] = of(row);
	return list;
}
