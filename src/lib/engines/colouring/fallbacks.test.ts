import { describe, expect, it } from 'vitest';
import {
	colourInOrder,
	hardMaps,
	properness,
	ruledFault,
	ruledProblem,
	type AnyMap,
} from '../../../../tests/support/adversary.ts';
import {
	minimumDegreeFive,
	randomTriangulation,
	scatteredMap,
} from '../../../../tests/support/planar.ts';
import { exactColouring, quickColouring } from './attempt.ts';
import { newBoard } from './board.ts';
import { effortOf } from './effort.ts';
import type { KempeStats } from './kempe.ts';
import { prepare } from './prepare.ts';
import { smallestLastOrder } from '../graph/smallest-last.ts';
import { wholeColouring } from './whole.ts';

/*
 * Each layer of the colourer and the test that forces it:
 *
 * graph: groups, apart pairs, bans    rules.property.test.ts; here: rules beside hard maps
 * planarity and its witness           ../graph/planarity.test.ts
 * chains and walks                    here: chains and walks colour the hard maps in any order
 * balls                               here: when walks are forbidden, even without any chain
 * whole map to the solver             here: when even balls are not asked, when chains have no steps
 * bounds: cycle, clique, wheel        tests/published/colouring.test.ts, proved-graphs.test.ts
 * refutation and its replay           tests/published/refutations.test.ts, ../solver/drup.test.ts
 * explanations                        explain.test.ts, explain.property.test.ts, release.property.test.ts
 * improver                            goals.property.test.ts, improve.property.test.ts
 * checker                             check-colouring.test.ts, explain.test.ts: planted faults
 */

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

	it('the whole map goes to the solver when chains have no steps left and balls no room', () => {
		const effort = { ...effortOf({ regions: 0, borders: { a: [], b: [] }, inks: 4 }), walk: 0 };
		const nothing = { ...effort, chainSteps: 0, chainStepsEach: 0, ballSize: 0 };
		let left = 0;
		for (let seed = 1; seed <= 40; seed++) {
			const map = minimumDegreeFive(20 + seed, seed);
			const prepared = prepare({ ...map, inks: 4 });
			const { order } = smallestLastOrder(prepared.graph);
			const settings = { order, sides: null, clique: [], effort: nothing, seed };
			if (quickColouring(prepared, 4, settings)) continue;
			left++;
			const answer = exactColouring(prepared, 4, settings);
			if (answer.status !== 'coloured') throw new Error(answer.status);
			expect(properness({ ...newBoard(prepared.graph, 4), ink: answer.ink })).toBeNull();
		}
		expect(left).toBeGreaterThan(3);
	});

	it('locks, forbidden inks and pairs that can be kept are kept on hard maps', async () => {
		for (let seed = 1; seed <= 60; seed++) {
			const maps = [named[seed % named.length], minimumDegreeFive(14 + seed, seed)];
			for (const map of maps) expect(await ruledFault(ruledProblem(map, seed))).toBeNull();
		}
	});
});
