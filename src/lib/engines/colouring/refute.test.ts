import { describe, expect, it } from 'vitest';
import { fewest } from '../../../../tests/support/brute-force.ts';
import { fixtureGraph, fromPairs, type EdgeList } from '../../../../tests/support/named-graphs.ts';
import { randomTriangulation } from '../../../../tests/support/planar.ts';
import { buildGraph } from '../graph/build-graph.ts';
import { checkRefutation } from './refute-check.ts';
import { refute } from './refute.ts';

const graphOf = ({ regions, borders }: EdgeList) => buildGraph(regions, borders.a, borders.b);

function refuted(map: EdgeList, inks: number) {
	const found = refute(graphOf(map), inks);
	if (!found) throw new Error('not refuted');
	const { regions, borders, clauses } = found;
	const refutation = { inks, format: 'drup' as const, clauses };
	const proof = { kind: 'refutation' as const, regions, borders, refutation };
	expect(checkRefutation(graphOf(map), proof)).toEqual([]);
	return found;
}

/** The part alone: only the borders it says it needs, vertices by their place in it. */
function partOf(map: EdgeList, { regions, borders }: ReturnType<typeof refuted>): EdgeList {
	const place = new Map(regions.map((region, i) => [region, i]));
	const { a, b } = map.borders;
	const among = borders ?? a.map((p, i): [number, number] => [p, b[i]]);
	const pairs = among.flatMap(([p, q]) => {
		const [i, j] = [place.get(p), place.get(q)];
		return i === undefined || j === undefined ? [] : [[i, j] as const];
	});
	return fromPairs(regions.length, pairs);
}

/** By trying everything: the part needs one ink more, and without any border it no longer does. */
function expectCritical(part: EdgeList, inks: number) {
	const needs = (map: EdgeList) => fewest({ ...map, inks: 'fewest' }, inks + 1);
	expect(needs(part)).toBe(inks + 1);
	const { a, b } = part.borders;
	for (let left = 0; left < a.length; left++) {
		const fewer = a.flatMap((p, i) => (i === left ? [] : [[p, b[i]] as const]));
		expect(needs(fromPairs(part.regions, fewer))).toBe(inks);
	}
}

describe('the part that a refutation is about', () => {
	it.each(['moser', 'golomb', 'chvatal', 'fritsch', 'poussin', 'errera'])(
		'of %s is critical: no border and no region can be spared',
		(name) => {
			const map = fixtureGraph(name);
			expectCritical(partOf(map, refuted(map, 3)), 3);
		},
	);

	it('of Golomb’s graph has 9 regions and 15 borders (by trying everything)', () => {
		const { regions, borders } = refuted(fixtureGraph('golomb'), 3);
		expect([regions.length, borders?.length ?? 15]).toEqual([9, 15]);
	});

	it('of random maps is critical', () => {
		for (let seed = 1; seed <= 8; seed++) {
			const { regions, borders } = randomTriangulation(14, seed);
			const map = { regions, borders: { a: [...borders.a], b: [...borders.b] } };
			expectCritical(partOf(map, refuted(map, 3)), 3);
		}
	});

	it('names only borders of the graph, which the checker sees to', () => {
		const map = fixtureGraph('golomb');
		const { regions, borders = [], clauses } = refuted(fixtureGraph('errera'), 3);
		const refutation = { inks: 3, format: 'drup' as const, clauses };
		const proof = { kind: 'refutation' as const, regions, borders, refutation };
		expect(checkRefutation(graphOf(map), { ...proof, regions: [0, 1] })).not.toEqual([]);
		const errera = graphOf(fixtureGraph('errera'));
		expect(checkRefutation(errera, { ...proof, borders: borders.slice(1) })).not.toEqual([]);
	});
});
