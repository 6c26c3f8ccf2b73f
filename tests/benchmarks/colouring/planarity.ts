import { buildGraph, checkKuratowski, planarity } from '../../../src/lib/engines/graph/index.ts';
import { scatteredMap } from '../../support/planar.ts';
import { countyMap } from './county-map.ts';
import { median, record, type ColouringRecord } from './record.ts';

/**
 * Whether a map can be drawn in a plane, with the shortened witness where it cannot: the counties, whose
 * file cannot, a land that can, and the same land with one border across it.
 */
export async function* planarVerdict(): AsyncGenerator<ColouringRecord> {
	const land = scatteredMap(3_000, 1);
	const across = {
		regions: land.regions,
		borders: { a: [...land.borders.a, 0], b: [...land.borders.b, farFrom(land.borders)] },
	};
	for (const [map, { regions, borders }] of Object.entries({
		counties: await countyMap(),
		land,
		'land with a border across': across,
	})) {
		const graph = buildGraph(regions, borders.a, borders.b);
		let verdict = planarity(graph);
		const milliseconds = await median(5, () => (verdict = planarity(graph)));
		const faults = verdict.planar ? [] : checkKuratowski(graph, verdict.witness);
		yield record({
			...{ name: 'planarity', map, regions, milliseconds, goalMilliseconds: 500 },
			planar: verdict.planar,
			witness: verdict.planar ? 0 : verdict.witness.paths.reduce((sum, p) => sum + p.length - 1, 0),
			met: faults.length === 0,
		});
	}
}

/** A region that does not border the first one, nor any region beside it. */
function farFrom({ a, b }: { a: ArrayLike<number>; b: ArrayLike<number> }): number {
	const near = new Set([0]);
	for (let rounds = 0; rounds < 3; rounds++) {
		const grown = [...near];
		for (let i = 0; i < a.length; i++) {
			if (near.has(a[i])) grown.push(b[i]);
			if (near.has(b[i])) grown.push(a[i]);
		}
		for (const region of grown) near.add(region);
	}
	let region = 0;
	while (near.has(region)) region++;
	return region;
}
