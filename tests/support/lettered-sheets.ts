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

/** A square of six regions in two rows with the names given, some kilometres across. */
export function namedSheet(names: string[]): SheetInput {
	const coverage = squares(names, (i) => [(i % 3) * 0.3, Math.floor(i / 3) * 0.3, 0.3]);
	return sheetOf(coverage, on('A4'));
}

/** A chain of islands, too small for their names, along a curve. */
export function islandsSheet(): SheetInput {
	const names = Array.from({ length: 24 }, (_, i) => `Isle of ${'ABCDEFGH'[i % 8]}orrin${i + 1}`);
	const coverage = squares(names, (i) => [
		4 * Math.cos(i / 8),
		4 * Math.sin(i / 8) + 50,
		0.04 + 0.02 * (i % 3),
	]);
	return sheetOf(coverage, on('A4'));
}
