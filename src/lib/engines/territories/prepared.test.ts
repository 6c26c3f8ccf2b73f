import { describe, expect, it } from 'vitest';
import { buildGraph } from '../graph/build-graph.ts';
import { prepare } from './prepared.ts';
import { mayEndIn, type Prepared } from './prepare.ts';
import type { Territory, TerritoryProblem } from './problem.ts';

const territory = (given: Partial<Territory> = {}): Territory => ({
	base: -1,
	capacity: 1,
	frozen: false,
	closing: false,
	...given,
});

/** Six units in a row, two territories of three. */
function row(given: Partial<TerritoryProblem> = {}): TerritoryProblem {
	return {
		graph: buildGraph(6, [0, 1, 2, 3, 4], [1, 2, 3, 4, 5]),
		measures: [{ name: 'visits', values: Float64Array.of(1, 2, 3, 4, 5, 9), tolerance: 0.5 }],
		today: Int32Array.of(0, 0, 0, 1, 1, 1),
		territories: [territory(), territory()],
		goal: 'fewest-moves',
		reach: null,
		seed: 1,
		effort: 'quick',
		...given,
	};
}

function ready(given: Partial<TerritoryProblem> = {}): Prepared {
	const prepared = prepare(row(given));
	if ('status' in prepared) throw new Error(prepared.message);
	return prepared;
}

describe('targets', () => {
	it('share the total by capacity among those that stay', () => {
		const prepared = ready({
			territories: [territory({ capacity: 0.5 }), territory(), territory({ closing: true })],
		});
		expect([...prepared.targets]).toEqual([8, 16, 0]);
		expect(prepared.greatest[1]).toBeCloseTo(24, 6);
		expect(prepared.greatest[1]).toBeGreaterThan(24);
		expect(prepared.least[1]).toBeLessThan(8);
	});

	it('count only measures with a tolerance', () => {
		const free = { name: 'free', values: new Float64Array(6), tolerance: null };
		const { bound, loads } = ready({ measures: [free, ...row().measures] });
		expect(bound).toEqual([1]);
		expect([...loads]).toEqual([1, 2, 3, 4, 5, 9]);
	});
});

describe('what is fixed', () => {
	it('is every base, lock and unit of a frozen territory, and what is tied to them', () => {
		const { fixed, open } = ready({
			today: Int32Array.of(0, 0, 0, 1, 2, 2),
			territories: [territory({ base: 0 }), territory(), territory({ frozen: true })],
			locks: Int32Array.of(-1, -1, -1, 1, -1, -1),
			together: [
				[2, 1],
				[1, 3],
			],
		});
		expect([...fixed]).toEqual([0, 1, 1, 1, 2, 2]);
		expect([...open]).toEqual([1, 1, 0]);
	});

	it('leaves the base of a leaver free', () => {
		const { fixed } = ready({
			territories: [territory({ base: 0, closing: true }), territory({ base: 0 })],
		});
		expect([...fixed]).toEqual([1, -1, -1, -1, -1, -1]);
	});
});

describe('compulsory moves', () => {
	it('are those of leavers, of units without territory and of parts without the base', () => {
		const today = Int32Array.of(0, 1, 0, 0, -1, 2);
		const territories = [territory({ base: 0 }), territory(), territory({ closing: true })];
		expect([...ready({ today, territories }).compulsory]).toEqual([0, 0, 1, 1, 1, 1]);
	});

	it('go by the larger load where there is no base', () => {
		expect([...ready({ today: Int32Array.of(0, 0, 0, 1, 1, 0) }).compulsory]).toEqual([
			1, 1, 1, 0, 0, 0,
		]);
	});
});

describe('reach', () => {
	const today = Int32Array.of(0, 0, 1, 1, 2, 2);
	const three = [territory(), territory(), territory()];

	it('counts steps between the areas of today', () => {
		const prepared = ready({ today, territories: three, reach: 1 });
		expect([...(prepared.steps ?? [])]).toEqual([0, 1, 2, 1, 0, 1, 2, 1, 0]);
		expect(mayEndIn(prepared, 0, 1)).toBe(true);
		expect(mayEndIn(prepared, 0, 2)).toBe(false);
	});

	it('gives a new hire the place of the base', () => {
		const { steps } = ready({ today, territories: [...three, territory({ base: 5 })], reach: 1 });
		expect([...(steps ?? [])].slice(12)).toEqual([3, 2, 1, 0]);
	});
});

describe('values that are missing', () => {
	it.each([NaN, -1, Infinity])('%d is told with its unit', (value) => {
		const values = Float64Array.of(1, 2, value, 4, 5, 9);
		const answer = prepare(row({ measures: [{ name: 'visits', values, tolerance: null }] }));
		expect(answer).toMatchObject({ reason: 'missing-value', witness: { units: [2] } });
	});

	it('tells a measure that is 0 everywhere', () => {
		const measure = { name: 'visits', values: new Float64Array(6), tolerance: 0.1 };
		expect(prepare(row({ measures: [measure] }))).toMatchObject({ reason: 'missing-value' });
	});
});

describe('what no caller may ask', () => {
	it.each<[string, Partial<TerritoryProblem>]>([
		['too few units', { today: Int32Array.of(0, 0) }],
		['an unknown territory', { today: Int32Array.of(0, 0, 0, 1, 1, 7) }],
		['an unknown unit', { together: [[0, 6]] }],
		['a shared base', { territories: [territory({ base: 2 }), territory({ base: 2 })] }],
		['no capacity', { territories: [territory({ capacity: 0 }), territory()] }],
		['a broken reach', { reach: 1.5 }],
		['a negative cost', { cost: Float64Array.of(1, 1, 1, 1, 1, -1) }],
	])('%s', (_, given) => {
		expect(() => prepare(row(given))).toThrow(RangeError);
	});
});
