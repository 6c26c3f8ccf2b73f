import { describe, expect, it } from 'vitest';
import {
	checkColouring,
	checkProofFile,
	colour,
	proofFile,
	type ColouringProblem,
	type ProofFile,
} from '../../src/lib/engines/colouring/index.ts';
import { Random } from '../../src/lib/engines/colouring/random.ts';
import { buildGraph, isPlanar } from '../../src/lib/engines/graph/index.ts';
import { fewest as byBruteForce } from '../support/brute-force.ts';
import { mcgregor } from '../support/mcgregor.ts';
import {
	cycle,
	fixtureGraph,
	fromPairs,
	kneser,
	mycielski,
	queens,
	type EdgeList,
} from '../support/named-graphs.ts';
import { satisfiable } from '../support/reference-solver.ts';

/** The fewest inks of a graph, every claim of the answer shown again by the checker of proof files. */
async function proved(map: EdgeList, rules: Partial<ColouringProblem> = {}) {
	const problem = { ...map, inks: 'fewest' as const, ...rules };
	const result = await colour(problem);
	if (result.status !== 'coloured') throw new Error(result.status);
	expect(checkColouring(problem, result)).toEqual([]);
	const names = Array.from({ length: map.regions }, (_, i) => ({ key: String(i) }));
	const file = (await proofFile(problem, result, names)) as ProofFile;
	const { claims, faults } = checkProofFile(JSON.parse(JSON.stringify(file)));
	expect(faults).toEqual([]);
	expect(claims).toHaveLength(2);
	return { inks: result.inksUsed, kind: result.proof.kind };
}

const graphOf = ({ regions, borders }: EdgeList) => buildGraph(regions, borders.a, borders.b);
const sizes = (map: EdgeList) => [map.regions, graphOf(map).targets.length / 2];

describe('McGregor’s map of order 10 (M. Gardner, Sci. Am., April 1975; Knuth, TAOCP 7.2.2.2)', () => {
	const map = mcgregor(10);

	it('has 110 regions and 324 borders, as many as a planar map can have', () => {
		expect(sizes(map)).toEqual([110, 324]);
		expect(324).toBe(3 * 110 - 6);
		expect(isPlanar(graphOf(map))).toBe(true);
	});

	// rows of the adjacency list in E. Wada's weblog "parametron", 23 April 2015
	it.each([
		[0, [1, 10, 11, 100, 101, 102, 103, 104, 105, 109]],
		[1, [0, 2, 11, 12, 109]],
		[5, [4, 6, 15, 16, 109]],
		[106, [10, 95, 96, 105, 107]],
		[108, [10, 97, 98, 107, 109]],
		[109, [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 19, 98, 108]],
	])('region %d borders those that others list', (region, neighbours) => {
		const { offsets, targets } = graphOf(map);
		const found = [...targets.subarray(offsets[region], offsets[region + 1])];
		expect(found.sort((a, b) => a - b)).toEqual(neighbours);
	});

	it('takes four inks after all', async () => {
		expect((await proved(map)).inks).toBe(4);
	});

	it.each([3, 4, 5, 7, 12])(
		'and so does order %d, of n(n+1) regions and 3n(n+1)-6 borders',
		async (n) => {
			expect(sizes(mcgregor(n))).toEqual([n * (n + 1), 3 * n * (n + 1) - 6]);
			expect(isPlanar(graphOf(mcgregor(n)))).toBe(true);
			expect((await proved(mcgregor(n))).inks).toBe(4);
		},
	);
});

describe('published numbers of inks, each proof replayed by the checker of proof files', () => {
	it.each(['errera', 'kittell', 'poussin', 'fritsch', 'moser', 'golomb', 'goldner', 'chvatal'])(
		'%s: 4 (sources in tests/fixtures/graphs)',
		async (name) => {
			expect((await proved(fixtureGraph(name))).inks).toBe(4);
		},
	);

	it.each([
		[5, 2],
		[6, 2],
		[7, 2],
		[7, 3],
		[8, 3],
	])(
		'Kneser graph K(%d,%d): n - 2k + 2 (L. Lovász, J. Comb. Theory A 25, 1978)',
		async (n, k) => {
			expect((await proved(kneser(n, k))).inks).toBe(n - 2 * k + 2);
		},
		60_000,
	);

	it('Mycielski graphs myciel3 and myciel4: 4 and 5 (DIMACS colouring instances, Trick 1993)', async () => {
		const third = mycielski(cycle(5));
		expect(await proved(third)).toEqual({ inks: 4, kind: 'refutation' });
		expect(await proved(mycielski(third))).toEqual({ inks: 5, kind: 'refutation' });
	}, 60_000);

	it('queens on boards of 5 and 7: 5 and 7 (DIMACS colouring instances)', async () => {
		expect((await proved(queens(5))).inks).toBe(5);
		expect((await proved(queens(7))).inks).toBe(7);
	}, 60_000);
});

describe('myciel5 (DIMACS: 47 vertices, 236 edges, chromatic number 6)', () => {
	it('takes 6 inks; what is said of 5 is no more than what was shown', async () => {
		const map = mycielski(mycielski(mycielski(cycle(5))));
		expect(sizes(map)).toEqual([47, 236]);
		const problem = { ...map, inks: 'fewest' as const, effort: 'quick' as const };
		const result = await colour(problem);
		if (result.status !== 'coloured') throw new Error(result.status);
		expect(checkColouring(problem, result)).toEqual([]);
		expect(result.inksUsed).toBe(6);
		// an odd ring shows 3; 6 is what is published
		expect(result.lowerBound).toBeGreaterThanOrEqual(3);
		expect(result.lowerBound).toBeLessThanOrEqual(6);
		if (result.proof.kind === 'not-proved') expect(result.proof.regions).toEqual([]);
	}, 120_000);
});

describe('m-part regions never need more than 6m inks (P. J. Heawood 1890)', () => {
	/** A random planar triangulation whose vertices are given to regions of m parts each. */
	it.each([1, 2, 3])(
		'%d parts each',
		async (m) => {
			for (let seed = 1; seed <= 3; seed++) {
				const random = new Random(100 * m + seed);
				const parts = stackedTriangulation(60, random);
				const order = Array.from({ length: parts.regions }, (_, i) => i);
				for (let i = order.length - 1; i > 0; i--) {
					const j = random.below(i + 1);
					[order[i], order[j]] = [order[j], order[i]];
				}
				const owner = new Int32Array(parts.regions);
				order.forEach((part, i) => (owner[part] = Math.floor(i / m)));
				const pairs = parts.borders.a
					.map((a, i) => [owner[a], owner[parts.borders.b[i]]] as const)
					.filter(([a, b]) => a !== b);
				const map = fromPairs(Math.ceil(parts.regions / m), pairs);
				const result = await colour({ ...map, inks: 'fewest', effort: 'quick' });
				if (result.status !== 'coloured') throw new Error(result.status);
				expect(result.inksUsed).toBeLessThanOrEqual(m === 1 ? 4 : 6 * m);
			}
		},
		60_000,
	);
});

/** Vertices put one by one into a random triangle of those before. */
function stackedTriangulation(regions: number, random: Random): EdgeList {
	const pairs: [number, number][] = [
		[0, 1],
		[1, 2],
		[0, 2],
	];
	const faces: [number, number, number][] = [
		[0, 1, 2],
		[0, 1, 2],
	];
	for (let v = 3; v < regions; v++) {
		const at = random.below(faces.length);
		const [a, b, c] = faces[at];
		pairs.push([a, v], [b, v], [c, v]);
		faces[at] = [a, b, v];
		faces.push([b, c, v], [a, c, v]);
	}
	return fromPairs(regions, pairs);
}

describe('random graphs', () => {
	const randomGraph = (regions: number, borders: number, seed: number): EdgeList => {
		const random = new Random(seed);
		const pairs = Array.from(
			{ length: borders },
			() => [random.below(regions), random.below(regions)] as [number, number],
		);
		return fromPairs(
			regions,
			pairs.filter(([a, b]) => a !== b),
		);
	};

	it('take as many inks as trying everything says', async () => {
		for (let seed = 1; seed <= 60; seed++) {
			const map = randomGraph(9, 8 + (seed % 5) * 5, seed);
			const { inks } = await proved(map);
			expect(inks).toBe(byBruteForce({ ...map, inks: 'fewest' }, 9));
		}
	}, 60_000);

	it('take as many inks as a reference solver says', async () => {
		for (let seed = 1; seed <= 25; seed++) {
			const map = randomGraph(24, 60 + (seed % 4) * 20, 1000 + seed);
			const { inks } = await proved(map);
			expect(colourable(map, inks)).toBe(true);
			expect(colourable(map, inks - 1)).toBe(false);
		}
	}, 120_000);
});

function colourable({ regions, borders }: EdgeList, inks: number): boolean {
	const each = Array.from({ length: inks }, (_, ink) => ink + 1);
	const needs = Array.from({ length: regions }, (_, r) => each.map((ink) => r * inks + ink));
	const differ = borders.a.flatMap((a, i) =>
		each.map((ink) => [-(a * inks + ink), -(borders.b[i] * inks + ink)]),
	);
	return satisfiable([...needs, ...differ]);
}
