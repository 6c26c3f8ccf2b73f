import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { byRule, complete, fixtureGraph, kneser } from '../../../../tests/support/named-graphs.ts';
import {
	minimumDegreeFive,
	randomTriangulation,
	scatteredMap,
} from '../../../../tests/support/planar.ts';
import { buildGraph } from './build-graph.ts';
import { checkKuratowski } from './kuratowski-check.ts';
import { isPlanar } from './left-right-test.ts';
import { planarity } from './planarity.ts';

interface Map {
	regions: number;
	borders: { a: ArrayLike<number>; b: ArrayLike<number> };
}

const graphOf = ({ regions, borders }: Map) => buildGraph(regions, borders.a, borders.b);

function expectWitness(map: Map): number {
	const graph = graphOf(map);
	const verdict = planarity(graph);
	if (verdict.planar) throw new Error('Said to be planar.');
	expect(checkKuratowski(graph, verdict.witness)).toEqual([]);
	return verdict.witness.paths.flat().length;
}

/**
 * Wagner's theorem by brute force: not planar exactly when contracting edges leads to a graph with K5
 * or K3,3 in it (K. Wagner, Math. Annalen 114, 1937). For a handful of vertices.
 */
function planarByMinors(rows: number[]): boolean {
	if (hasKuratowski(rows)) return false;
	for (let i = 0; i < rows.length; i++) {
		for (let j = i + 1; j < rows.length; j++) {
			if ((rows[i] >> j) & 1 && !planarByMinors(contract(rows, i, j))) return false;
		}
	}
	return true;
}

function contract(rows: number[], i: number, j: number): number[] {
	const merged = rows.map((row) => ((row >> j) & 1 ? row | (1 << i) : row));
	merged[i] = (rows[i] | rows[j]) & ~(1 << i);
	const cut = (row: number) => (row & ((1 << j) - 1)) | ((row >> (j + 1)) << j);
	return merged.filter((_, v) => v !== j).map(cut);
}

function hasKuratowski(rows: number[]): boolean {
	const all = rows.map((_, v) => v);
	const choose = (from: number[], k: number): number[][] =>
		k === 0
			? [[]]
			: from.flatMap((v, i) => choose(from.slice(i + 1), k - 1).map((rest) => [v, ...rest]));
	const joined = (s: number[], t: number[]) =>
		s.every((u) => t.every((v) => u === v || (rows[u] >> v) & 1));
	if (choose(all, 5).some((five) => joined(five, five))) return true;
	return choose(all, 3).some((three) =>
		choose(
			all.filter((v) => !three.includes(v)),
			3,
		).some((other) => joined(three, other)),
	);
}

describe('planarity', () => {
	it('knows K5, K3,3, the Petersen graph and hypercubes (standard textbook cases)', () => {
		expectWitness(complete(5));
		expectWitness(byRule(6, (i, j) => i < 3 && j >= 3));
		expectWitness(kneser(5, 2));
		const cube = (d: number) => byRule(1 << d, (i, j) => Math.log2(i ^ j) % 1 === 0);
		expect(isPlanar(graphOf(cube(3)))).toBe(true);
		expectWitness(cube(4));
	});

	it('finds the published planar maps planar', () => {
		for (const name of ['errera', 'kittell', 'poussin', 'fritsch', 'moser', 'golomb', 'goldner']) {
			expect(isPlanar(graphOf(fixtureGraph(name)))).toBe(true);
		}
	});

	it('agrees with Wagner’s theorem by brute force on seven vertices', () => {
		const edges = fc.array(fc.tuple(fc.nat(6), fc.nat(6)), { minLength: 8, maxLength: 22 });
		let outcomes = 0;
		fc.assert(
			fc.property(edges, (pairs) => {
				const rows = Array<number>(7).fill(0);
				for (const [a, b] of pairs.filter(([p, q]) => p !== q)) {
					rows[a] |= 1 << b;
					rows[b] |= 1 << a;
				}
				const map = byRule(7, (i, j) => ((rows[i] >> j) & 1) === 1);
				const planar = planarByMinors(rows);
				expect(isPlanar(graphOf(map))).toBe(planar);
				if (!planar) expectWitness(map);
				outcomes |= planar ? 1 : 2;
			}),
			{ numRuns: 100 },
		);
		expect(outcomes).toBe(3);
	});

	it('accepts triangulations and refuses them with any border more', () => {
		for (let seed = 1; seed <= 60; seed++) {
			const map =
				seed % 2 ? randomTriangulation(8 + seed, seed) : minimumDegreeFive(14 + seed, seed);
			expect(isPlanar(graphOf(map))).toBe(true);
			const graph = graphOf(map);
			const row = graph.targets.subarray(0, graph.offsets[1]);
			const other = [...Array(map.regions).keys()].find((v) => v > 0 && !row.includes(v));
			if (other === undefined) continue;
			const a = [...map.borders.a, 0];
			const b = [...map.borders.b, other];
			const thinned = { a: a.filter((_, i) => i % 9 !== 4), b: b.filter((_, i) => i % 9 !== 4) };
			expectWitness({ regions: map.regions, borders: { a, b } });
			const thin = graphOf({ regions: map.regions, borders: thinned });
			const verdict = planarity(thin);
			if (!verdict.planar) expect(checkKuratowski(thin, verdict.witness)).toEqual([]);
		}
	});

	it('gives a short witness for a district with a part far away', () => {
		const map = scatteredMap(3000, 4);
		const graph = graphOf(map);
		const far = graph.targets[graph.offsets[1500]];
		const near = graph.targets[graph.offsets[7]];
		if (near === far) throw new Error('Choose other districts.');
		const a = [...map.borders.a, near, near, near, near];
		const row = graph.targets.subarray(graph.offsets[far], graph.offsets[far] + 4);
		const b = [...map.borders.b, ...row].slice(0, a.length);
		expect(expectWitness({ regions: map.regions, borders: { a, b } })).toBeLessThan(400);
	});
});
