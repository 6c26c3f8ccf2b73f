import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { neighbors } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';

/** The 3,231 counties of us-atlas 3.0.1 (npm) and who shares a line with whom, by topojson-client. */
export async function countyMap() {
	const path = createRequire(import.meta.url).resolve('us-atlas/counties-10m.json');
	const topology = JSON.parse(await readFile(path, 'utf8')) as Topology;
	const counties = topology.objects.counties as GeometryCollection;
	const rows = neighbors(counties.geometries);
	const pairs = rows.flatMap((row, i) => row.filter((j) => j < i).map((j) => [i, j]));
	const borders = { a: pairs.map((pair) => pair[0]), b: pairs.map((pair) => pair[1]) };
	return { regions: rows.length, borders };
}
