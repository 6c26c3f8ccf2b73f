import { describe, expect, it } from 'vitest';
import { territory } from '../../../../tests/support/small-territories.ts';
import { buildGraph } from '../graph/build-graph.ts';
import { preCheck } from './pre-check.ts';
import { prepare } from './prepared.ts';
import type { Impossible, TerritoryProblem } from './problem.ts';

/** Six units in a row with loads that sum to 60, two territories of three. */
function answer(given: Partial<TerritoryProblem>, tolerance = 0.2): Impossible | null {
	const prepared = prepare({
		graph: buildGraph(6, [0, 1, 2, 3, 4], [1, 2, 3, 4, 5]),
		measures: [{ name: 'visits', values: Float64Array.of(10, 10, 10, 10, 10, 10), tolerance }],
		today: Int32Array.of(0, 0, 0, 1, 1, 1),
		territories: [territory(), territory()],
		goal: 'fewest-moves',
		reach: null,
		seed: 1,
		effort: 'quick',
		...given,
	});
	return 'status' in prepared ? prepared : preCheck(prepared);
}

const visits = (...values: number[]) => [
	{ name: 'visits', values: Float64Array.from(values), tolerance: 0.2 },
];

describe('pre-checks in words', () => {
	it('pass what can be done', () => {
		expect(answer({})).toBeNull();
	});

	it('a unit too heavy, what would do, and that it can be split', () => {
		expect(answer({ measures: visits(5, 5, 5, 5, 40, 0) })).toEqual({
			status: 'impossible',
			reason: 'unit-too-heavy',
			message:
				'#4, which may end in 2 territories, has 40 of visits, and @0 may have 36 at most; ' +
				'a tolerance of 33.4 % for visits would do.',
			witness: { units: [4], territories: [0, 1] },
			relief: [
				{ kind: 'tolerance', measure: 0, value: 40 / 30 - 1 },
				{ kind: 'split', unit: 4 },
			],
		});
	});

	it('units tied together that are too heavy', () => {
		const together = [
			[0, 1],
			[1, 2],
		] as const;
		expect(answer({ measures: visits(15, 15, 15, 5, 5, 5), together })).toMatchObject({
			reason: 'unit-too-heavy',
			witness: { units: [0, 1, 2] },
			relief: [{ kind: 'tolerance', measure: 0, value: 0.5 }],
		});
	});

	it('a lock behind a wall of locks, and which of them to take away', () => {
		const found = answer({ locks: Int32Array.of(0, -1, -1, 1, -1, 0) });
		expect(found).toMatchObject({
			reason: 'lock-cut-off',
			message: '#5 must end in @0, but no chain of units that may end there joins it to #0.',
			witness: { units: [5, 0], territories: [0] },
		});
		expect(found?.relief).toEqual([
			{ kind: 'unlock', unit: 5 },
			{ kind: 'unlock', unit: 0 },
			{ kind: 'unlock', unit: 3 },
		]);
	});

	it('a frozen territory outside its tolerance', () => {
		const territories = [territory({ frozen: true }), territory()];
		expect(answer({ measures: visits(15, 15, 15, 5, 5, 5), territories })).toMatchObject({
			reason: 'frozen-outside-tolerance',
			message:
				'@0 is frozen with 45 of visits, 50 % above its target of 30; ' +
				'a tolerance of that size would do.',
			relief: [
				{ kind: 'unfreeze', territory: 0 },
				{ kind: 'tolerance', measure: 0, value: 0.5 },
			],
		});
	});

	it('an island whose load is no whole number of targets', () => {
		const graph = buildGraph(6, [0, 1, 2, 4], [1, 2, 3, 5]);
		expect(answer({ graph })).toMatchObject({
			reason: 'island-load',
			message:
				'No number of targets within tolerance makes up the 40 of visits of the part of 4 units ' +
				'around #0, where 0 to 2 territories can live; a tolerance of 33.4 % for visits would do.',
			witness: { units: [0, 1, 2, 3], territories: [] },
			relief: [{ kind: 'tolerance', measure: 0 }],
		});
	});

	it('an island without anybody', () => {
		const graph = buildGraph(6, [0, 1, 2, 3], [1, 2, 3, 4]);
		const territories = [territory({ base: 0 }), territory({ base: 4 })];
		expect(answer({ graph, territories })).toMatchObject({
			reason: 'island-load',
			message: 'No territory can take #5.',
		});
	});

	it('fewer units than territories', () => {
		const territories = Array.from({ length: 7 }, () => territory());
		expect(answer({ territories })).toMatchObject({
			reason: 'no-plan',
			message: '7 territories that stay cannot each have one of 6 units.',
		});
	});

	it('a territory that nobody can join', () => {
		const territories = [territory(), territory(), territory()];
		expect(answer({ territories, reach: 1 })).toMatchObject({
			reason: 'no-plan',
			message: '@2 stays but can get no unit: all are fixed elsewhere or out of reach.',
		});
	});
});

describe('rules that contradict each other', () => {
	const bases = [territory({ base: 0 }), territory({ base: 5 })];
	it.each<[string, Partial<TerritoryProblem>]>([
		[
			'#0 is the base of @0, and #0 is locked to @1.',
			{ territories: bases, locks: Int32Array.of(1, -1, -1, -1, -1, -1) },
		],
		[
			'#0 is the base of @0, and #5 is the base of @1, but #0 and #5 must stay together.',
			{ territories: bases, together: [[0, 5]] },
		],
		[
			'#5 must stay together with #0 of @0, but @0 is frozen without #5.',
			{ territories: [territory({ frozen: true }), territory()], together: [[0, 5]] },
		],
		[
			'#1 and #2 must be apart, but both are tied to @0.',
			{ apart: [[1, 2]], locks: Int32Array.of(-1, 0, 0, -1, -1, -1) },
		],
		[
			'#1 and #2 must be apart, but other rules keep them together.',
			{ apart: [[1, 2]], together: [[2, 1]] },
		],
		[
			'#1 is locked to @1, which closes.',
			{
				territories: [territory(), territory({ closing: true })],
				locks: Int32Array.of(-1, 1, -1, -1, -1, -1),
			},
		],
	])('%s', (message, given) => {
		expect(answer(given)).toMatchObject({ reason: 'lock-cut-off', message });
	});
});
