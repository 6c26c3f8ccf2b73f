/** Sheets on which names are hard to place: many, small, far apart, in several scripts. */
import { readFileSync } from 'node:fs';
import type { SheetInput, SheetLayout } from '../../src/lib/engines/sheet/index.ts';
import { accepted } from './read-boundaries.ts';
import { countiesCoverage, layout, sheetOf, statesCoverage, worldCoverage } from './sheets.ts';

const on = (paper: SheetLayout['paper'], more: Partial<SheetLayout> = {}) => ({
	layout: { ...layout, paper, ...more },
});

export const statesSheet = (): SheetInput => sheetOf(statesCoverage(), on('A4'));
export const countiesSheet = (): SheetInput => sheetOf(countiesCoverage(), on('A1'));
export const worldSheet = (): SheetInput => sheetOf(worldCoverage(), on('A3'));

/** The made-up republic as the demo lays it out: districts within provinces on A4. */
export async function tavaroeSheet(grouped = true): Promise<SheetInput> {
	const read = await accepted(readFileSync('sample-data/tavaroe.geojson'));
	const { columns, rows } = read.attributes;
	const provinces = rows.map((row) => String(row[columns.indexOf('province')]));
	return sheetOf(read.coverage, {
		...on('A4', { groupColumn: grouped ? 'province' : null }),
		...(grouped ? { groups: provinces } : {}),
	});
}
