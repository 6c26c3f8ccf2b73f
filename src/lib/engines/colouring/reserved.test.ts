import { describe, expect, it } from 'vitest';
import { scatteredMap } from '../../../../tests/support/planar.ts';
import { checkColouring } from './check-colouring.ts';
import { colour } from './colour.ts';
import { checkExplanation } from './explain-check.ts';
import { problemFaults } from './faults.ts';
import type { ColouringProblem } from './problem.ts';

/** Four regions that all border each other. */
const four: ColouringProblem = {
	regions: 4,
	borders: { a: [0, 0, 0, 1, 1, 2], b: [1, 2, 3, 2, 3, 3] },
	inks: 4,
};
const locked = (...inks: number[]) => Int32Array.from(inks);

describe('reserved inks', () => {
	it('go to no region that is not locked to them, and the proof says that this costs an ink', async () => {
		const problem: ColouringProblem = { ...four, inks: 'fewest', reserved: [1] };
		const result = await colour(problem);
		expect(checkColouring(problem, result)).toEqual([]);
		expect(result).toMatchObject({ inksUsed: 5, lowerBound: 5, proof: { kind: 'refutation' } });
	});

	it('go to a region kept alike with one that is locked to them', async () => {
		const problem: ColouringProblem = {
			...four,
			regions: 5,
			inks: 'fewest',
			reserved: [0],
			alike: [[4, 2]],
			locks: locked(-1, -1, -1, -1, 0),
		};
		const result = await colour(problem);
		expect(checkColouring(problem, result)).toEqual([]);
		expect(result).toMatchObject({ inksUsed: 4 });
		if (result.status === 'coloured') expect(result.colouring[2]).toBe(0);
	});

	it('are refused by the checker when they are had without a lock', async () => {
		const problem: ColouringProblem = { ...four, inks: 5, reserved: [4] };
		const result = await colour(problem);
		if (result.status !== 'coloured') throw new Error(result.status);
		const colouring = result.colouring.map((ink) => (ink === 3 ? 4 : ink));
		expect(checkColouring(problem, { ...result, colouring, inksUsed: 5 })).toContain(
			`Region ${colouring.indexOf(4)} has the reserved ink 4, but no lock gives it.`,
		);
	});

	it('are not had by the region whose lock a way out drops', async () => {
		// Both locked regions border. One must keep ink 3: without any lock on it three inks are left for four.
		const problem: ColouringProblem = { ...four, reserved: [3], locks: locked(3, 3, -1, -1) };
		const result = await colour(problem);
		if (result.status !== 'impossible') throw new Error(result.status);
		const { explanation } = result;
		expect(await checkExplanation(problem, explanation)).toEqual([]);
		expect(explanation).toMatchObject({ locks: [0, 1], release: { cost: 1, proved: true } });
	});

	it('are blamed when the rules cannot be kept without them', async () => {
		const problem: ColouringProblem = { ...four, reserved: [2] };
		const result = await colour(problem);
		if (result.status !== 'impossible') throw new Error(result.status);
		const { rules, inksThatWouldDo } = result.explanation;
		expect(await checkExplanation(problem, result.explanation)).toEqual([]);
		expect(rules.filter(({ kind }) => kind === 'reserved')).toHaveLength(4);
		expect(inksThatWouldDo).toBe(5);
	});

	it('are a fault when they are no inks', () => {
		expect(problemFaults({ ...four, reserved: [1, -1] })).toEqual([
			"'reserved' names ink -1, which does not exist.",
		]);
	});

	it('of a large map are kept from every region, and proved to be needed beside the others', async () => {
		const { regions, borders } = scatteredMap(33_000, 5);
		const problem: ColouringProblem = { regions, borders, inks: 'fewest', reserved: [0, 2, 5, 6] };
		const result = await colour(problem);
		expect(checkColouring(problem, result)).toEqual([]);
		if (result.status !== 'coloured') throw new Error(result.status);
		expect([...new Set(result.colouring)].sort()).toEqual([1, 3, 4, 7]);
		expect(result).toMatchObject({ inksUsed: 8, lowerBound: 8, proof: { kind: 'refutation' } });
	});
});
