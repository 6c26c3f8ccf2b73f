import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { smallProblems } from '../../../../tests/support/small-territories.ts';
import { Board } from './board.ts';
import { figures } from './figures.ts';
import { missingValues } from './missing-values.ts';
import type { PlanFigures } from './figures-of.ts';
import type { TerritoryProblem } from './problem.ts';
import { geometryFrom } from './unit-geometry.ts';

function geometryOf({ graph }: TerritoryProblem) {
	const pairs = Array.from({ length: graph.count }, (_, u) =>
		Array.from(graph.targets.subarray(graph.offsets[u], graph.offsets[u + 1]), (v) => [u, v]),
	)
		.flat()
		.filter(([u, v]) => u < v);
	return geometryFrom({
		at: Float64Array.from({ length: 2 * graph.count }, (_, i) => (i % 2 ? 47 : 8 + i / 20)),
		areaKm2: Float64Array.from({ length: graph.count }, (_, u) => 50 + u),
		borders: {
			a: pairs.map((p) => p[0]),
			b: pairs.map((p) => p[1]),
			metres: pairs.map(([u, v]) => 1000 * (u + v + 1)),
		},
		outerMetres: Float64Array.from({ length: graph.count }, (_, u) => 7000 + u),
	});
}

const runs = fc
	.tuple(smallProblems(12), fc.array(fc.tuple(fc.nat(11), fc.integer({ min: -1, max: 2 }))))
	.filter(([problem]) => missingValues(problem) === null);

describe('live figures', () => {
	it('after any moves are those worked out from scratch', () => {
		fc.assert(
			fc.property(runs, ([problem, moves]) => {
				const geometry = geometryOf(problem);
				const board = new Board(problem, problem.today, geometry);
				board.figures();
				for (const [unit, to] of moves) {
					if (unit >= problem.graph.count || to >= problem.territories.length) continue;
					board.move(unit, to);
					if (unit % 3 === 0) board.figures();
				}
				expect(board.figures()).toEqual(figures(problem, board.assignment, geometry));
			}),
			{ numRuns: 300 },
		);
	});

	it('agree with counting unit by unit', () => {
		fc.assert(
			fc.property(runs, ([problem, moves]) => {
				const board = new Board(problem, problem.today, geometryOf(problem));
				for (const [unit, to] of moves) {
					if (unit < problem.graph.count && to < problem.territories.length) board.move(unit, to);
				}
				expectCounted(problem, board.assignment, board.figures());
			}),
			{ numRuns: 300 },
		);
	});
});

function expectCounted(problem: TerritoryProblem, now: Int32Array, told: PlanFigures) {
	const { today, graph, measures, territories } = problem;
	const units = Array.from(today.keys());
	const moved = units.filter((u) => today[u] !== now[u]);
	const cost = moved.reduce((sum, u) => sum + (problem.cost ? problem.cost[u] : 1), 0);
	expect(told.movedUnits).toBe(moved.length);
	expect(told.movedCost).toBe(cost);
	let cut = 0;
	let outline = 0;
	for (const u of units) {
		outline += 7000 + u;
		for (const v of graph.targets.subarray(graph.offsets[u], graph.offsets[u + 1])) {
			if (v > u && now[u] >= 0 && now[v] >= 0 && now[u] !== now[v]) cut++;
			if (now[u] !== now[v]) outline += 1000 * (u + v + 1);
		}
	}
	expect(told.cutBorders.after).toBe(cut);
	const alone = units.filter((u) => now[u] < 0);
	if (alone.length === 0) {
		const perimeters = told.territories.reduce((sum, t) => sum + (t.shape?.perimeterKm ?? 0), 0);
		expect(perimeters).toBeCloseTo(outline / 1000, 6);
	}
	territories.forEach((_, t) => {
		const own = told.territories[t];
		const count = (test: (u: number) => boolean) => units.filter(test).length;
		expect(own.units).toBe(count((u) => now[u] === t));
		expect(own.gainedUnits).toBe(count((u) => now[u] === t && today[u] !== t));
		expect(own.lostUnits).toBe(count((u) => now[u] !== t && today[u] === t));
		measures.forEach(({ values }, m) => {
			const sum = (test: (u: number) => boolean) =>
				units.filter(test).reduce((all, u) => all + values[u], 0);
			const { load, today: before, gained, lost, kept } = own.measures[m];
			expect(load).toBe(sum((u) => now[u] === t));
			expect(before.load).toBe(sum((u) => today[u] === t));
			expect(load - gained).toBe(kept);
			expect(before.load - lost).toBe(kept);
		});
	});
}
