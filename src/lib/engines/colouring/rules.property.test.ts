import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { feasible, fewest } from '../../../../tests/support/brute-force.ts';
import { checkColouring } from './check-colouring.ts';
import { colour } from './colour.ts';
import type { ColouringProblem } from './problem.ts';

/** Maps of three to eight regions under any mixture of rules, some of them impossible. */
const ruled = fc.integer({ min: 3, max: 8 }).chain((regions) => {
	const region = fc.nat(regions - 1);
	const pairs = (maxLength: number) =>
		fc
			.array(fc.tuple(region, region), { maxLength })
			.map((list) => list.filter(([a, b]) => a !== b));
	return fc
		.record({
			borders: pairs(16),
			apart: pairs(2),
			alike: pairs(2),
			reserved: fc.oneof(fc.constant([]), fc.array(fc.nat(5), { maxLength: 3 })),
			forbidden: fc.array(fc.tuple(region, fc.nat(4)), { maxLength: 6 }),
			locks: fc.array(fc.integer({ min: -6, max: 4 }), {
				minLength: regions,
				maxLength: regions,
			}),
			inks: fc.oneof(fc.constant('fewest' as const), fc.integer({ min: 1, max: 5 })),
			seed: fc.nat(100),
		})
		.map((record): ColouringProblem => {
			const borders = { a: record.borders.map((p) => p[0]), b: record.borders.map((p) => p[1]) };
			const locks = Int32Array.from(record.locks, (ink) => Math.max(ink, -1));
			return { ...record, regions, borders, locks };
		});
});

describe('colouring under rules against trying everything', () => {
	it('colours exactly the problems that can be coloured, with the fewest inks', async () => {
		const seen = new Set<string>();
		await fc.assert(
			fc.asyncProperty(ruled, async (problem) => {
				const result = await colour(problem);
				seen.add(result.status);
				expect(checkColouring(problem, result)).toEqual([]);
				const least = fewest(problem, 12);
				if (problem.inks !== 'fewest') {
					const possible = feasible(problem, problem.inks);
					expect(result.status).toBe(possible ? 'coloured' : 'impossible');
				} else if (result.status === 'coloured') {
					expect(result.inksUsed).toBe(least);
					expect(result.lowerBound).toBe(least);
					expect(result.proof.kind).not.toBe('not-proved');
				} else {
					expect([result.status, least]).toEqual(['impossible', null]);
				}
				if (result.status === 'coloured') {
					if (problem.reserved?.length) seen.add('with reserved inks');
					expect(result.lowerBound).toBeLessThanOrEqual(least as number);
				}
			}),
			{ numRuns: 400 },
		);
		expect([...seen].sort()).toEqual(['coloured', 'impossible', 'with reserved inks']);
	});
});
