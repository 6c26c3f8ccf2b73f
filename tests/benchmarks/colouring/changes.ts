import { colour } from '../../../src/lib/engines/colouring/index.ts';
import { redrawnMap } from '../../support/redrawn-map.ts';
import { record, type ColouringRecord } from './record.ts';

/** Regions, borders redrawn, and the goal; the last one is told without a goal. */
const cases = [
	[3_000, 60, 1_000],
	[20_000, 300, 10_000],
	[3_000, 150, undefined],
] as const;

/** Fewest changes after borders were redrawn: how many, and whether that is proved to be the fewest. */
export async function* changes(): AsyncGenerator<ColouringRecord> {
	for (const [regions, clashes, goalMilliseconds] of cases) {
		for (const seed of [1, 2, 3]) {
			const problem = await redrawnMap(regions, clashes, seed);
			const started = performance.now();
			const result = await colour(problem);
			const milliseconds = Math.round(performance.now() - started);
			if (result.status !== 'coloured' || !result.changes) throw new Error(result.status);
			const { count, lowerBound } = result.changes;
			const proved = count === lowerBound;
			yield record({
				...{ name: 'fewest changes', regions: problem.regions, clashes, seed, milliseconds },
				...{ goalMilliseconds, changed: count, lowerBound, proved },
				...(goalMilliseconds === undefined ? {} : { met: proved }),
			});
		}
	}
}
