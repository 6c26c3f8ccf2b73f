import { describe, expect, it } from 'vitest';
import { checkColouring } from './check-colouring.ts';
import { colour } from './colour.ts';
import type { ColouringProblem, ColouringResult } from './problem.ts';

type Coloured = Extract<ColouringResult, { status: 'coloured' }>;

/** A ring of five round a hub and one more beside it, with a rule of every kind. */
const problem: ColouringProblem = {
	regions: 7,
	borders: { a: [0, 0, 0, 0, 0, 1, 2, 3, 4, 5, 6], b: [1, 2, 3, 4, 5, 2, 3, 4, 5, 1, 5] },
	inks: 5,
	locks: Int32Array.of(0, -1, -1, -1, -1, -1, -1),
	forbidden: [[1, 1]],
	reserved: [4],
	alike: [[1, 6]],
	apart: [[2, 6]],
	previous: Int32Array.of(0, 2, 1, 2, 1, 3, 2),
	goal: 'fewest-changes',
};

async function found(): Promise<Coloured> {
	const result = await colour(problem);
	if (result.status !== 'coloured') throw new Error(result.status);
	return result;
}

const withInk = (result: Coloured, region: number, ink: number): Coloured => ({
	...result,
	colouring: result.colouring.map((old, r) => (r === region ? ink : old)),
});

describe('the checker of colourings', () => {
	it('finds nothing wrong with what the engine found', async () => {
		const result = await found();
		expect(result.changes).toEqual({ count: 0, lowerBound: 0 });
		expect(checkColouring(problem, result)).toEqual([]);
	});

	it('finds every fault that is planted', async () => {
		const result = await found();
		const { proof, colouring } = result;
		const faults: [Coloured, RegExp][] = [
			[withInk(result, 3, 1), /Bordering regions 2 and 3/],
			[withInk(result, 0, 4), /lock of region 0 is broken/],
			[withInk(result, 1, 1), /Region 1 has its forbidden ink 1/],
			[withInk(result, 3, 4), /Region 3 has the reserved ink 4/],
			[withInk(result, 6, 0), /Regions 1 and 6 are not kept alike/],
			[withInk(result, 6, 1), /Regions 2 and 6 are not kept apart/],
			[withInk(result, 3, -1), /Region 3 has no ink/],
			[withInk(result, 3, 7), /Ink 7 is used, but there are 5/],
			[withInk(result, 3, 3), /1 regions changed, not 0/],
			[{ ...result, inksUsed: 3 }, /3 inks are said to be used/],
			[{ ...result, lowerBound: 9 }, /lower bound is above/],
			[{ ...result, lowerBound: 2 }, /lower bound is below/],
			[{ ...result, colouring: colouring.slice(1) }, /does not cover every region/],
			[{ ...result, proof: { ...proof, regions: [0, 1, 2, 3, 9] } }, /does not exist/],
			[{ ...result, proof: { ...proof, regions: [0, 1, 1] } }, /names a region twice/],
			[{ ...result, proof: { kind: 'clique', regions: [0, 1, 2] } }, /./],
			[{ ...result, proof: { kind: 'odd-cycle', regions: [1, 2, 3] } }, /./],
			[{ ...result, proof: { kind: 'none-needed', regions: [] } }, /needs a proof/],
			[{ ...result, changes: { count: 0, lowerBound: 1 } }, /Fewer regions changed/],
		];
		for (const [spoilt, told] of faults)
			expect(checkColouring(problem, spoilt).join(' '), String(told)).toMatch(told);
	});
});
