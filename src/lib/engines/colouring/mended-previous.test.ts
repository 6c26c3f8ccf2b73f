import { describe, expect, it } from 'vitest';
import { mycielski as oneMore, type EdgeList } from '../../../../tests/support/named-graphs.ts';
import { colour } from './colour.ts';
import { effortOf } from './effort.ts';
import { fewestInks } from './fewest.ts';
import { mendedPrevious } from './mended-previous.ts';
import { prepare } from './prepare.ts';
import { checkColouring } from './check-colouring.ts';
import type { ColouringProblem } from './problem.ts';

/** Mycielski's graph that needs so many inks (Mycielski 1955), without triangles. */
function mycielski(inks: number): ColouringProblem {
	let graph: EdgeList = { regions: 2, borders: { a: [0], b: [1] } };
	for (let n = 2; n < inks; n++) graph = oneMore(graph);
	return { ...graph, inks: 'fewest' };
}

const settingsFor = (problem: ColouringProblem) => ({
	...{ order: new Uint32Array(0), sides: null, clique: [], seed: 0 },
	effort: effortOf(problem),
});

describe('an earlier colouring with fewer inks than are found at once', () => {
	// a crown: complete bipartite without a perfect matching, where first-fit orders use many inks
	const crown = 7;
	const borders = { a: [] as number[], b: [] as number[] };
	for (let i = 0; i < crown; i++) {
		for (let j = 0; j < crown; j++) {
			if (i === j) continue;
			borders.a.push(i);
			borders.b.push(crown + j);
		}
	}

	it('is kept, and mended where a rule has changed', async () => {
		const problem = mycielski(5);
		const found = await colour(problem);
		if (found.status !== 'coloured') throw new Error('not coloured');
		expect(found.inksUsed).toBe(5);
		const region = 3;
		const locks = new Int32Array(problem.regions).fill(-1);
		locks[region] = (found.colouring[region] + 1) % 5;
		const changed = {
			...problem,
			locks,
			previous: found.colouring,
			goal: 'fewest-changes',
		} as const;
		const again = await colour({ ...changed, effort: 'quick' });
		if (again.status !== 'coloured') throw new Error('not coloured');
		expect(again.inksUsed).toBe(5);
		expect(checkColouring(changed, again)).toEqual([]);
		expect(again.changes?.count).toBeLessThanOrEqual(12);
	});

	it('is taken where quick tries need more, and searched below', () => {
		const ink = Int32Array.of(0, 1, 2);
		const asked: number[] = [];
		const exact = (inks: number) => {
			asked.push(inks);
			return { status: 'unknown' as const };
		};
		const quick = (inks: number) => (inks >= 5 ? Int32Array.of(0, 3, 4) : null);
		const atHand = (fewerThan: number) => (fewerThan > 3 ? { inks: 3, ink } : null);
		expect(fewestInks(2, 9, { quick, exact, atHand })).toEqual({ inks: 3, ink, lowerBound: 2 });
		expect(asked).toEqual([2]);
		expect(fewestInks(2, 9, { quick, exact })).toMatchObject({ inks: 5 });
	});

	it('is of no use with as many inks or more, or where a lock needs more', () => {
		const problem = { ...mycielski(3), previous: Int32Array.of(0, 1, 0, 1, 2) };
		const settings = settingsFor(problem);
		const mended = (given: ColouringProblem, fewerThan: number) =>
			mendedPrevious(given, prepare(given), settings, fewerThan);
		expect(mended(problem, 4)?.inks).toBe(3);
		expect(mended(problem, 3)).toBeNull();
		const locks = Int32Array.of(-1, 3, -1, -1, -1);
		expect(mended({ ...problem, locks }, 9)).toBeNull();
		expect(mended({ ...problem, previous: undefined }, 9)).toBeNull();
	});

	it('does not stand in the way of fewer', async () => {
		const previous = Int32Array.from({ length: 2 * crown }, (_, v) => v % crown);
		const found = await colour({ regions: 2 * crown, borders, inks: 'fewest', previous });
		expect(found).toMatchObject({ status: 'coloured', inksUsed: 2, lowerBound: 2 });
	});
});
