import { describe, expect, it } from 'vitest';
import {
	fractalNeighbours,
	fractalText,
	type FractalLand,
} from '../../../../tests/support/fractal-land.ts';
import { accepted, pairsOf } from '../../../../tests/support/read-boundaries.ts';
import { coverageFaults } from './index.ts';

// The land knows its own neighbours from its rows and columns: nothing is read for that.
describe('a land of fractal borders', () => {
	it.each<[string, FractalLand]>([
		['drawn alike on both sides', { regions: 3142, inner: 23, seed: 5 }],
		['with corners on the edges of others', { regions: 600, inner: 17, seed: 6, isHalved: true }],
	])('%s has the neighbours of its rows', async (_, land) => {
		const text = [...fractalText(land)].join('');
		const read = await accepted(new TextEncoder().encode(text));
		const known: string[] = [];
		fractalNeighbours(land, (a, b, isPoint) => {
			const pair = [String(a), String(b)].sort().join('-');
			known.push(`${pair} ${isPoint ? 'point' : 'line'}`);
		});
		expect(pairsOf(read)).toEqual(known.sort());
		expect(coverageFaults(read.coverage)).toEqual([]);
	});
});
