import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fewest } from '../../../../tests/support/brute-force.ts';
import { checkColouring } from './check-colouring.ts';
import { colour } from './colour.ts';
import type { ColouringProblem } from './problem.ts';

/** Any graph of up to nine regions, as a list of pairs that may repeat. */
const maps = fc.integer({ min: 0, max: 9 }).chain((regions) =>
	fc
		.array(fc.tuple(fc.nat(Math.max(0, regions - 1)), fc.nat(Math.max(0, regions - 1))), {
			maxLength: regions < 2 ? 0 : 30,
		})
		.map((pairs) => pairs.filter(([a, b]) => a !== b))
		.map((pairs): ColouringProblem => {
			const borders = { a: pairs.map((p) => p[0]), b: pairs.map((p) => p[1]) };
			return { regions, borders, inks: 'fewest' };
		}),
);

describe('colouring against trying everything', () => {
	it('never claims a bound that is wrong, nor a colouring that fails', async () => {
		await fc.assert(
			fc.asyncProperty(maps, fc.nat(1000), async (map, seed) => {
				const problem = { ...map, seed };
				const result = await colour(problem);
				expect(checkColouring(problem, result)).toEqual([]);
				if (result.status !== 'coloured') throw new Error('There is always a colouring.');
				const least = fewest(problem, 9) as number;
				expect(result.lowerBound).toBeLessThanOrEqual(least);
				expect(result.inksUsed).toBeGreaterThanOrEqual(least);
			}),
			{ numRuns: 300 },
		);
	});
});
