import { describe, expect, it } from 'vitest';
import { buildGraph } from '../../src/lib/engines/graph/index.ts';
import { solveExact } from '../../src/lib/engines/territories/exact.ts';
import { prepare, type Territory } from '../../src/lib/engines/territories/index.ts';
import { equalParts, gridPairs } from '../support/partitions.ts';

/**
 * Ways to part an n by n grid into n connected parts of n cells, rook neighbours: OEIS A167248 and
 * A167251, and Schutzman's table of grid partitions. The fewest cut borders are not published; they are
 * computed here by trying every one.
 */
const published = [
	{ n: 3, count: 10, cuts: 6 },
	{ n: 4, count: 117, cuts: 8 },
	{ n: 5, count: 4006, cuts: 16 },
	{ n: 6, count: 451_206, cuts: 18 },
];

const limits = { rounds: 100, nodes: 100_000, iterations: 2_000_000 };

/** n territories of n cells each, none of them placed but the one that holds the first corner. */
function gridProblem(n: number) {
	const pairs = gridPairs(n, n);
	const territories = Array.from({ length: n }, (_, t): Territory => ({
		base: t === 0 ? 0 : -1,
		capacity: 1,
		frozen: false,
		closing: false,
	}));
	const prepared = prepare({
		graph: buildGraph(
			n * n,
			pairs.map(([a]) => a),
			pairs.map(([, b]) => b),
		),
		measures: [{ name: 'cells', values: new Float64Array(n * n).fill(1), tolerance: 0 }],
		today: new Int32Array(n * n).fill(-1),
		territories,
		goal: 'fewest-moves',
		reach: null,
		seed: 1,
		effort: 'normal',
	});
	if ('status' in prepared) throw new Error(prepared.message);
	return prepared;
}

/** Parts numbered by their lowest cell. */
function named(parts: ArrayLike<number>): string {
	const names = new Map<number, number>();
	return Array.from(parts, (part) => {
		if (!names.has(part)) names.set(part, names.size);
		return names.get(part);
	}).join('');
}

describe('equal parts of a grid', () => {
	it.each(published)(
		'$n by $n: $count ways, $cuts cut borders at least',
		({ n, count, cuts }) => {
			expect(equalParts(n)).toEqual({ count, fewestCuts: cuts });
		},
		180_000,
	);

	it.each(published.slice(0, 2))(
		'$n by $n: the exact solver finds one of them with $cuts cut borders',
		async ({ n, cuts }) => {
			const ways = new Set<string>();
			equalParts(n, (part) => ways.add(named(part)));
			const outcome = await solveExact(gridProblem(n), { least: 'cuts' }, limits);
			if (outcome.status !== 'optimal') throw new Error(outcome.status);
			expect(outcome.value).toBeCloseTo(cuts, 6);
			expect(ways.has(named(outcome.assignment))).toBe(true);
		},
		180_000,
	);
});
