/** Sheets on which names are hard to place: many, small, far apart, in several scripts. */
import { readFileSync } from 'node:fs';
import type { SheetInput, SheetLayout } from '../../src/lib/engines/sheet/index.ts';
import { accepted, acceptedFeatures } from './read-boundaries.ts';
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

type Square = [lon: number, lat: number, side: number];

async function squares(names: string[], at: (i: number) => Square): Promise<SheetInput> {
	const features = names.map((name, i) => {
		const [x, y, side] = at(i);
		const ring = [
			[x, y],
			[x + side, y],
			[x + side, y + side],
			[x, y + side],
			[x, y],
		];
		const geometry = { type: 'Polygon' as const, coordinates: [ring] };
		return { type: 'Feature' as const, properties: { code: `k${i}`, name }, geometry };
	});
	const { coverage } = await acceptedFeatures(features, { keyField: 'code', nameField: 'name' });
	return sheetOf(coverage, on('A4'));
}

/** Regions in rows of three, with room for the names given. */
export const namedSheet = (names: string[]): Promise<SheetInput> =>
	squares(names, (i) => [(i % 3) * 0.5, Math.floor(i / 3) * 0.5, 0.5]);

/** A chain of islands along a curve, too small for their names. */
export function islandsSheet(): Promise<SheetInput> {
	const names = Array.from({ length: 24 }, (_, i) => `Isle of ${'ABCDEFGH'[i % 8]}orrin ${i + 1}`);
	return squares(names, (i) => [
		4 * Math.cos(i / 8),
		4 * Math.sin(i / 8) + 50,
		0.04 + 0.02 * (i % 3),
	]);
}
