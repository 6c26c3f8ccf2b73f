import { colour } from '../../../src/lib/engines/colouring/index.ts';
import { delaunayMap } from '../../support/planar.ts';
import { redrawnMap } from '../../support/redrawn-map.ts';
import { countyMap } from './county-map.ts';
import { processorTime, record, type ColouringRecord } from './record.ts';

/** Maps, borders redrawn, seeds, and the goal; the last is told without a goal. */
const cases = [
	{ map: 'counties', clashes: 60, seeds: [1, 2, 3], goal: 1_000 },
	{ map: 'triangulation', regions: 3_000, clashes: 60, seeds: [1, 2, 3], goal: 1_000 },
	{ map: 'triangulation', regions: 20_000, clashes: 300, seeds: [1], goal: 10_000 },
	{ map: 'triangulation', regions: 3_000, clashes: 150, seeds: [1] },
];

/**
 * Fewest changes after borders were redrawn: how many, and whether that is proved to be the fewest. In a
 * triangulation no border could be added, so that nearly every region has the other three inks around it. Processor time, since other work may share the machine.
 */
export async function* changes(): AsyncGenerator<ColouringRecord> {
	for (const { map: kind, regions = 0, clashes, seeds, goal } of cases) {
		for (const seed of seeds) {
			const map = kind === 'counties' ? await countyMap() : delaunayMap(regions, seed);
			const problem = await redrawnMap(map, clashes, seed);
			const started = processorTime();
			const result = await colour(problem);
			const milliseconds = processorTime() - started;
			if (result.status !== 'coloured' || !result.changes) throw new Error(result.status);
			const { count, lowerBound } = result.changes;
			const proved = count === lowerBound;
			yield record({
				...{ name: 'fewest changes', map: kind, regions: problem.regions, clashes, seed },
				...{ milliseconds, goalMilliseconds: goal, changed: count, lowerBound, proved },
				...(goal === undefined ? {} : { met: proved }),
			});
		}
	}
}
