import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { neighbors } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import { describe, expect, it } from 'vitest';
import { checkColouring, colour } from '../../src/lib/engines/colouring/index.ts';
import { buildGraph, isPlanar } from '../../src/lib/engines/graph/index.ts';
import {
	complete,
	cycle,
	fixtureGraph,
	fromPairs,
	join,
	kneser,
	mycielski,
	queens,
	type EdgeList,
} from '../support/named-graphs.ts';

/** Colours with the fewest inks, checks the answer independently and tells inks and kind of proof. */
async function fewest(map: EdgeList) {
	const problem = { ...map, inks: 'fewest' as const };
	const result = await colour(problem);
	if (result.status !== 'coloured') throw new Error(result.status);
	expect(checkColouring(problem, result)).toEqual([]);
	expect(result.lowerBound).toBe(result.inksUsed);
	return { inks: result.inksUsed, proof: result.proof };
}

function counts({ regions, borders }: EdgeList): [number, number] {
	return [regions, buildGraph(regions, borders.a, borders.b).targets.length / 2];
}

describe('published graphs, all of four inks (sources in tests/fixtures/graphs)', () => {
	it.each([
		['errera', 17, 45],
		['kittell', 23, 63],
		['poussin', 15, 39],
		['fritsch', 9, 21],
		['moser', 7, 11],
		['golomb', 10, 18],
		['goldner', 11, 27],
		['chvatal', 12, 24],
	])('%s', async (name, vertices, edges) => {
		const map = fixtureGraph(name);
		expect(counts(map)).toEqual([vertices, edges]);
		expect((await fewest(map)).inks).toBe(4);
	});

	it('Moser and Golomb have neither K4 nor odd wheel, so a refutation shows it', async () => {
		for (const name of ['moser', 'golomb']) {
			expect((await fewest(fixtureGraph(name))).proof.kind).toBe('refutation');
		}
	});
});

describe('families with a known number of inks', () => {
	it('complete graphs, also beyond 32 inks', async () => {
		expect((await fewest(complete(40))).inks).toBe(40);
	});

	it('Kneser graphs K(n,k): n - 2k + 2 (L. Lovász, J. Comb. Theory A 25, 1978)', async () => {
		for (const [n, k] of [
			[5, 2],
			[6, 2],
			[7, 2],
			[7, 3],
		]) {
			expect((await fewest(kneser(n, k))).inks).toBe(n - 2 * k + 2);
		}
	});

	it('Mycielski graphs: one more each time (J. Mycielski, Colloq. Math. 3, 1955)', async () => {
		const third = mycielski(cycle(5));
		const fourth = mycielski(third);
		expect(counts(fourth)).toEqual([23, 71]);
		expect((await fewest(third)).inks).toBe(4);
		expect((await fewest(fourth)).inks).toBe(5);
	});

	it('queens on boards of 5 and 7 (DIMACS colouring instances): 5 and 7', async () => {
		expect(counts(queens(5))).toEqual([25, 160]);
		expect((await fewest(queens(5))).inks).toBe(5);
		expect(counts(queens(7))).toEqual([49, 476]);
		expect((await fewest(queens(7))).inks).toBe(7);
	});

	it('queens on a board of 6: 7, one more than the largest clique', async () => {
		expect(counts(queens(6))).toEqual([36, 290]);
		expect((await fewest(queens(6))).inks).toBe(7);
	}, 240_000);

	it('Sulanke’s map of two-part regions, K6 joined to C5: 9 (M. Gardner, Sci. Am. 1980)', async () => {
		const map = join(complete(6), cycle(5));
		expect(counts(map)).toEqual([11, 50]);
		expect((await fewest(map)).inks).toBe(9);
	}, 240_000);
});

const require = createRequire(import.meta.url);

function atlas(file: string, layer: string, keep: (id: string) => boolean): EdgeList {
	const topology = JSON.parse(
		readFileSync(require.resolve(`us-atlas/${file}`), 'utf8'),
	) as Topology;
	const { geometries } = topology.objects[layer] as GeometryCollection;
	const chosen = geometries.filter(({ id }) => keep(String(id).padStart(2, '0')));
	const rows = neighbors(chosen);
	const pairs = rows.flatMap((row, a) => row.filter((b) => b > a).map((b) => [a, b] as const));
	return fromPairs(chosen.length, pairs);
}

describe('real maps (us-atlas 3.0.1, from the Census Bureau)', () => {
	const overseas = new Set(['02', '15', '60', '66', '69', '72', '78']);

	it('the contiguous states and the capital’s district: 49 / 107, four inks by an odd wheel', async () => {
		const map = atlas('states-10m.json', 'states', (id) => !overseas.has(id));
		// D. E. Knuth, The Art of Computer Programming 7 (2008): 49 vertices, 107 edges
		expect(counts(map)).toEqual([49, 107]);
		expect(isPlanar(buildGraph(map.regions, map.borders.a, map.borders.b))).toBe(true);
		const { inks, proof } = await fewest(map);
		expect(inks).toBe(4);
		expect(proof.kind).toBe('odd-wheel');
		expect(proof.regions).toHaveLength(6);
	});

	it('the counties take four inks, though their borders are not planar', async () => {
		const map = atlas('counties-10m.json', 'counties', () => true);
		expect(map.regions).toBe(3231);
		expect(isPlanar(buildGraph(map.regions, map.borders.a, map.borders.b))).toBe(false);
		expect((await fewest(map)).inks).toBe(4);
	});
});
