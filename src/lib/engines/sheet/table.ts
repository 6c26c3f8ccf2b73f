import type { Coverage } from '../boundaries/coverage.ts';
import type { Drawing } from './drawing.ts';
import { isOnSheet } from './labels/set-name.ts';
import { themeColumns, type ThemeColumns } from './themed.ts';

/** A region as a row: what the map shows of it, for readers who use the table instead. */
export interface SheetRow {
	region: number;
	key: string;
	name: string;
	group: string | null;
	/** from 1 as in the legend; null while nothing is coloured */
	inkNumber: number | null;
	inkName: string | null;
	/** the ink itself, whoever the drawing's reader is */
	hex: string | null;
	areaKm2: number;
	/** whether its name stands on the map, or a number that the sheet's list explains */
	labelled: boolean;
	/** its class, where the sheet shows a measure: then `inkName` and `hex` are those of the class */
	theme?: ThemeColumns;
}

/** The sheet as a table, one row a region in region order: the equal of the map without sight. */
export function sheetTable(
	drawing: Drawing,
	coverage: Pick<Coverage, 'areasKm2'>,
	groups: (string | null)[],
): SheetRow[] {
	const { themed, inks } = drawing;
	return drawing.fills.map(({ region, key, name, ink }) => {
		const used = ink < 0 ? null : drawing.inks[ink];
		return {
			region,
			key,
			name,
			group: groups[region],
			inkNumber: used && ink + 1,
			inkName: used && used.name,
			hex: used && used.hex,
			areaKm2: coverage.areasKm2[region],
			labelled: isOnSheet(drawing.lettering.how[region]),
			...(themed && { theme: themeColumns({ inks, told: themed.told }, ink) }),
		};
	});
}
