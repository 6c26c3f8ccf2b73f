import { colour } from '../../../src/lib/engines/colouring/index.ts';
import { buildGraph } from '../../../src/lib/engines/graph/index.ts';
import { mcgregor } from '../../support/mcgregor.ts';
import { fixtureGraph } from '../../support/named-graphs.ts';
import { countyMap } from './county-map.ts';
import { median, record, type ColouringRecord } from './record.ts';
import { dsatur, greedySmallestLast } from './rivals.ts';

/**
 * Maps that are known for misleading heuristics: inks of ours, of DSATUR and of greedy smallest-last. All
 * of them need four and no more (sources beside the published checks of the same maps).
 */
export async function* knownMaps(): AsyncGenerator<ColouringRecord> {
	const maps = {
		counties: await countyMap(),
		McGregor: mcgregor(10),
		...Object.fromEntries(
			['errera', 'kittell', 'fritsch', 'poussin'].map((name) => [name, fixtureGraph(name)]),
		),
	};
	for (const [name, map] of Object.entries(maps)) {
		const graph = buildGraph(map.regions, map.borders.a, map.borders.b);
		let inks = 0;
		const milliseconds = await median(5, async () => {
			const result = await colour({ ...map, inks: 'fewest' });
			if (result.status === 'coloured') inks = result.inksUsed;
		});
		yield record({
			...{ name: `inks of ${name}`, regions: map.regions, milliseconds, inks },
			...{ goalInks: 4, met: inks === 4 },
			dsaturInks: dsatur(graph),
			smallestLastInks: greedySmallestLast(graph),
		});
	}
}
