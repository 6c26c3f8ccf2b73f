import type { SheetRow } from '../sheet/index.ts';
import { territoryColumns } from './territory-columns.ts';
import type { ExtraColumn, FurtherValues } from './source.ts';
import { figureColumn, themeExtraColumns } from './theme-columns.ts';

/** Class, range and figure of a themed sheet, then territories; none of what the sheet has not. */
export function furtherColumns(
	rows: readonly SheetRow[],
	{ territories, figures }: FurtherValues,
): ExtraColumn[] {
	return [
		...themeExtraColumns(rows),
		...(figures ? figureColumn(rows, figures) : []),
		...(territories ? territoryColumns(territories) : []),
	];
}
