import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gridGraph, logNormal } from '../../../../tests/support/territories.ts';
import { ruleFaults } from './check-rules.ts';
import { Dice } from './dice.ts';
import { fromScratch, problemOfScratch, type ScratchProblem } from './from-scratch.ts';
import { treeSplit } from './tree-split.ts';

const squareOf = (side: number): ScratchProblem => ({
	graph: gridGraph(side),
	measures: [{ name: 'cells', values: new Float64Array(side * side).fill(1), tolerance: 0 }],
	count: side,
	seed: 1,
	effort: 'quick',
});

describe('territories from scratch', () => {
	// Fewest borders cut by divisions of a square into rows of equal parts: enumerated over all plans,
	// whose numbers (10, 117, 4,006 and 451,206) are published (OEIS A167248).
	it.each([
		[3, 6],
		[4, 8],
		[5, 16],
		[6, 18],
	])('divide a square of side %i with %i borders cut, the fewest there are', async (side, cuts) => {
		const problem = squareOf(side);
		const plan = await fromScratch(problem);
		if (plan.status !== 'proposed') throw new Error(plan.status);
		expect(ruleFaults(problemOfScratch(problem), plan.assignment)).toEqual([]);
		expect(plan.cutBorders.after).toBe(cuts);
	});

	it('grow from bases, and keep tolerances', async () => {
		const problem = {
			...squareOf(12),
			measures: [{ name: 'load', values: logNormal(144, 0.4, 2), tolerance: 0.1 }],
			count: 4,
			bases: [0, 11, 132, -1],
		};
		const plan = await fromScratch(problem);
		if (plan.status !== 'proposed') throw new Error(plan.status);
		expect(ruleFaults(problemOfScratch(problem), plan.assignment)).toEqual([]);
		expect([plan.assignment[0], plan.assignment[11], plan.assignment[132]]).toEqual([0, 1, 2]);
	});

	it('are told impossible where parts of the map cannot be shared', async () => {
		const problem = squareOf(3);
		const measures = [
			{ ...problem.measures[0], values: Float64Array.of(9, 1, 1, 1, 1, 1, 1, 1, 1) },
		];
		expect((await fromScratch({ ...problem, measures })).status).toBe('impossible');
	});
});

describe('a tree split', () => {
	it('gives two joined parts of the sizes asked for at least', () => {
		fc.assert(
			fc.property(
				fc.integer({ min: 2, max: 8 }),
				fc.integer(),
				fc.double({ min: 0.2, max: 0.8 }),
				(side, seed, share) => {
					const graph = gridGraph(side);
					const units = [...Array(graph.count).keys()];
					const load = logNormal(graph.count, 0.5, 1);
					const parts = treeSplit(graph, units, load, share, [1, 1], new Dice(seed));
					if (!parts) throw new Error('no split');
					expect(parts.flat().sort((a, b) => a - b)).toEqual(units);
					for (const part of parts) expect(isJoined(side, part)).toBe(true);
				},
			),
			{ numRuns: 40, seed: 2 },
		);
	});
});

function isJoined(side: number, cells: number[]): boolean {
	const left = new Set(cells);
	const reach = (cell: number): void => {
		if (!left.delete(cell)) return;
		for (const step of [-side, side]) reach(cell + step);
		if (cell % side > 0) reach(cell - 1);
		if (cell % side < side - 1) reach(cell + 1);
	};
	reach(cells[0]);
	return left.size === 0;
}
