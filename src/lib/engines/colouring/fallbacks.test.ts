import { describe, expect, it } from 'vitest';
import {
	colourInOrder,
	hardMaps,
	properness,
	type AnyMap,
} from '../../../../tests/support/adversary.ts';
import {
	minimumDegreeFive,
	randomTriangulation,
	scatteredMap,
} from '../../../../tests/support/planar.ts';
import { newBoard } from './board.ts';
import type { KempeStats } from './kempe.ts';
import { prepare } from './prepare.ts';
import { wholeColouring } from './whole.ts';

const named = hardMaps();

function run(map: AnyMap, seed: number, options: { chains: boolean; walk: number }): KempeStats {
	const { board, stats } = colourInOrder(map, seed, options);
	expect(stats.finished).toBe(true);
	expect(properness(board)).toBeNull();
	return stats;
}

describe('what follows when no ink is free', () => {
	it('chains and walks colour the hard maps in any order', () => {
		let walks = 0;
		for (let seed = 1; seed <= 150; seed++) {
			for (const map of named) walks += run(map, seed, { chains: true, walk: 1_000 }).walks;
			walks += run(minimumDegreeFive(20 + seed, seed), seed, { chains: true, walk: 1_000 }).walks;
		}
		expect(walks).toBeGreaterThan(20);
	});

	it('balls do when walks are forbidden', () => {
		let stuck = 0;
		for (let seed = 1; seed <= 100; seed++) {
			for (const map of named) stuck += run(map, seed, { chains: true, walk: 0 }).stuck;
			stuck += run(minimumDegreeFive(20 + seed, seed), seed, { chains: true, walk: 0 }).stuck;
		}
		expect(stuck).toBeGreaterThan(10);
	});

	it('balls do even without any chain', () => {
		const options = { chains: false, walk: 0 };
		let stuck = 0;
		for (let seed = 0; seed <= 30; seed++) {
			for (const map of named) stuck += run(map, seed, options).stuck;
			stuck += run(randomTriangulation(200, seed), seed, options).stuck;
		}
		stuck += run(minimumDegreeFive(2_000, 1), 0, options).stuck;
		stuck += run(scatteredMap(5_000, 1), 0, options).stuck;
		expect(stuck).toBeGreaterThan(300);
	});

	it('the whole map goes to the solver when even balls are not asked', () => {
		for (const map of [...named, minimumDegreeFive(150, 2), randomTriangulation(300, 3)]) {
			const prepared = prepare({ ...map, inks: 4 });
			const inks = wholeColouring(prepared, 4, { conflicts: 200_000, size: 1e6, clique: [] });
			if (typeof inks === 'string') throw new Error(inks);
			expect(properness({ ...newBoard(prepared.graph, 4), ink: inks })).toBeNull();
			expect(wholeColouring(prepared, 2, { conflicts: 1_000, size: 1e6, clique: [] })).toBe(
				'unsat',
			);
		}
	});
});
