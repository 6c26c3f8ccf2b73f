import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { smallProblems, territory } from '../../../../tests/support/small-territories.ts';
import { buildGraph } from '../graph/build-graph.ts';
import { cutBorders, territoryGraph } from './territory-graph.ts';
import { tornParts } from './torn-parts.ts';

/** Seven units in a row. */
const row = buildGraph(7, [0, 1, 2, 3, 4, 5], [1, 2, 3, 4, 5, 6]);
const two = [territory(), territory()];

describe('torn territories', () => {
	it('none in a whole map', () => {
		expect(tornParts(row, Int32Array.of(0, 0, 0, 1, 1, 1, -1), two)).toEqual([]);
	});

	it('by number of units, the rooted part first', () => {
		const torn = tornParts(row, Int32Array.of(0, 1, 0, 0, 1, 1, 0), two);
		expect(torn).toEqual([
			{ territory: 0, parts: [[2, 3], [0], [6]] },
			{ territory: 1, parts: [[4, 5], [1]] },
		]);
	});

	it('by load, by units and then by lowest unit', () => {
		const today = Int32Array.of(0, 1, 0, 0, 1, 0, 0);
		const parts = (...load: number[]) =>
			tornParts(row, today, two, Float64Array.from(load))[0].parts;
		expect(parts(9, 0, 1, 1, 0, 1, 1)[0]).toEqual([0]);
		expect(parts(2, 0, 1, 1, 0, 1, 1)[0]).toEqual([2, 3]);
		expect(parts(1, 0, 1, 1, 0, 1, 1)[0]).toEqual([2, 3]);
	});

	it('by the base, wherever it lies', () => {
		const today = Int32Array.of(0, 1, 0, 0, 1, 0, 0);
		const from = (base: number) => tornParts(row, today, [territory({ base }), territory()])[0];
		expect(from(0).parts).toEqual([[0], [2, 3], [5, 6]]);
		expect(from(4).parts).toEqual([[2, 3, 5, 6], [0]]);
		const far = tornParts(row, Int32Array.of(0, 0, 1, 1, 1, 1, 1), [
			territory({ base: 6 }),
			territory(),
		]);
		expect(far).toEqual([{ territory: 0, parts: [[], [0, 1]] }]);
	});
});

describe('the graph of territories', () => {
	it('counts every border between two once', () => {
		fc.assert(
			fc.property(smallProblems(12), ({ graph, today, territories }) => {
				const counts = new Map<string, number>();
				for (let u = 0; u < graph.count; u++) {
					for (const v of graph.targets.subarray(graph.offsets[u], graph.offsets[u + 1])) {
						const [s, t] = [today[u], today[v]];
						if (v < u || s < 0 || t < 0 || s === t) continue;
						const pair = `${Math.min(s, t)}-${Math.max(s, t)}`;
						counts.set(pair, (counts.get(pair) ?? 0) + 1);
					}
				}
				const metres = new Float64Array(graph.targets.length).fill(5);
				const pairs = territoryGraph(graph, today, territories.length, metres);
				const told = Array.from(pairs.a, (a, i) => [`${a}-${pairs.b[i]}`, pairs.borders[i]]);
				expect(told).toEqual([...counts].sort(([p], [q]) => (p < q ? -1 : 1)));
				expect(pairs.metres).toEqual(Float64Array.from(pairs.borders, (count) => 5 * count));
				const total = [...counts.values()].reduce((sum, count) => sum + count, 0);
				expect(cutBorders(graph, today)).toBe(total);
			}),
			{ numRuns: 300 },
		);
	});
});
