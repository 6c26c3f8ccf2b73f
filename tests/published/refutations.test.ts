import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { checkRefutation } from '../../src/lib/engines/colouring/refute-check.ts';
import { refute } from '../../src/lib/engines/colouring/refute.ts';
import { buildGraph } from '../../src/lib/engines/graph/build-graph.ts';
import type { RegionGraph } from '../../src/lib/engines/graph/region-graph.ts';

type Pair = [number, number];

const graphOf = (count: number, pairs: Pair[]) =>
	buildGraph(
		count,
		pairs.map((pair) => pair[0]),
		pairs.map((pair) => pair[1]),
	);

/** A graph in the DIMACS .col form (vertices from 1). */
function fixture(name: string): RegionGraph {
	const text = readFileSync(new URL(`../fixtures/graphs/${name}.col`, import.meta.url), 'utf8');
	const words = text.split('\n').map((line) => line.split(' '));
	const count = Number(words.find((line) => line[0] === 'p')?.[2]);
	const edges = words.filter((line) => line[0] === 'e');
	return graphOf(
		count,
		edges.map((line) => [Number(line[1]) - 1, Number(line[2]) - 1]),
	);
}

/** Mycielski 1955: no triangle, and each needs one ink more than the last; `steps` 2 is the ring of 5. */
function mycielski(steps: number): RegionGraph {
	let count = 2;
	let pairs: Pair[] = [[0, 1]];
	for (let step = 2; step <= steps; step++) {
		const twins = pairs.flatMap(([a, b]): Pair[] => [
			[a + count, b],
			[a, b + count],
		]);
		const top = Array.from({ length: count }, (_, v): Pair => [v + count, 2 * count]);
		pairs = [...pairs, ...twins, ...top];
		count = 2 * count + 1;
	}
	return graphOf(count, pairs);
}

/** Squares of a board, joined where a queen goes from one to the other. */
function queens(side: number): RegionGraph {
	const pairs: Pair[] = [];
	for (let a = 0; a < side * side; a++) {
		for (let b = 0; b < a; b++) {
			const down = Math.abs(Math.floor(a / side) - Math.floor(b / side));
			const across = Math.abs((a % side) - (b % side));
			if (down === 0 || across === 0 || down === across) pairs.push([a, b]);
		}
	}
	return graphOf(side * side, pairs);
}

function expectRefuted(graph: RegionGraph, inks: number): { regions: number[]; clauses: string } {
	const result = refute(graph, inks);
	if (!result) throw new Error('not refuted');
	const refutation = { inks, format: 'drup' as const, clauses: result.clauses };
	const { regions, borders } = result;
	expect(checkRefutation(graph, { kind: 'refutation', regions, borders, refutation })).toEqual([]);
	return result;
}

describe('graphs that need one ink more', () => {
	it.each([
		['moser', 3, 7, 'L. Moser and W. Moser 1961'],
		['golomb', 3, 9, 'S. Golomb; a critical part of 9 vertices'],
	])('%s cannot do with %d inks', (name, inks, size) => {
		const graph = fixture(name);
		expect(expectRefuted(graph, inks).regions).toHaveLength(size);
		expect(refute(graph, inks + 1)).toBeNull();
	});

	// Chromatic numbers as in the DIMACS colouring instances myciel3, myciel4 (Trick 1993): 4 and 5.
	it.each([
		[3, 11],
		[4, 23],
	])("Mycielski's graph of step %d, of which nothing can be spared", (steps, size) => {
		const graph = mycielski(steps);
		expect(graph.count).toBe(size);
		expect(expectRefuted(graph, steps).regions).toHaveLength(size);
		expect(refute(graph, steps + 1)).toBeNull();
	});

	// Chromatic numbers as in the DIMACS instances queen5_5, queen6_6, queen7_7: 5, 7 and 7.
	it.each([
		[5, 5],
		[6, 7],
		[7, 7],
	])('queens on a board of side %d need %d inks', (side, needed) => {
		const graph = queens(side);
		expectRefuted(graph, needed - 1);
		expect(refute(graph, needed)).toBeNull();
	});

	it('tells why a map of triangles with odd wheels fails, by the wheel', () => {
		const rim: Pair[] = [1, 2, 3, 4, 5].map((v) => [v, (v % 5) + 1]);
		const spokes: Pair[] = [1, 2, 3, 4, 5].map((v) => [0, v]);
		const tail: Pair[] = [
			[5, 6],
			[6, 7],
		];
		expect(expectRefuted(graphOf(8, [...rim, ...spokes, ...tail]), 3).regions.sort()).toEqual([
			0, 1, 2, 3, 4, 5,
		]);
	});
});

describe('checkRefutation', () => {
	const graph = fixture('golomb');
	const { regions, clauses } = expectRefuted(graph, 3);
	const proof = (change: object) => ({
		kind: 'refutation' as const,
		regions,
		refutation: { inks: 3, format: 'drup' as const, clauses },
		...change,
	});

	it('refuses a proof for other regions, other inks or other borders', () => {
		expect(checkRefutation(graph, proof({}))).toEqual([]);
		expect(checkRefutation(graph, proof({ regions: regions.slice(1) }))).not.toEqual([]);
		expect(checkRefutation(graph, proof({ regions: [...regions, regions[0]] }))).not.toEqual([]);
		expect(checkRefutation(graph, proof({ regions: [...regions, 99] }))).not.toEqual([]);
		const more = { inks: 4, format: 'drup', clauses };
		expect(checkRefutation(graph, proof({ refutation: more }))).not.toEqual([]);
		expect(checkRefutation(graph, proof({ refutation: undefined }))).not.toEqual([]);
		expect(checkRefutation(mycielski(3), proof({}))).not.toEqual([]);
	});
});
