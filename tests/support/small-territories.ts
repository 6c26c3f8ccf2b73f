import fc from 'fast-check';
import { buildGraph } from '../../src/lib/engines/graph/build-graph.ts';
import type { Territory, TerritoryProblem } from '../../src/lib/engines/territories/index.ts';

/** A territory with nothing special about it, but for what is given. */
export const territory = (given: Partial<Territory> = {}): Territory => ({
	base: -1,
	capacity: 1,
	frozen: false,
	closing: false,
	...given,
});

/**
 * Small problems with every kind of rule, many of them contradictory, torn or with islands; tolerances
 * from a twentieth to two thirds, loads in whole numbers from 0 to 9.
 */
export function smallProblems(mostUnits: number): fc.Arbitrary<TerritoryProblem> {
	return fc
		.record({
			units: fc.integer({ min: 1, max: mostUnits }),
			count: fc.integer({ min: 1, max: 3 }),
		})
		.chain(({ units, count }) => withSizes(units, count));
}

function withSizes(units: number, count: number): fc.Arbitrary<TerritoryProblem> {
	const unit = fc.nat(units - 1);
	const each = <T>(of: fc.Arbitrary<T>) => fc.array(of, { minLength: units, maxLength: units });
	const rarely = <T>(of: fc.Arbitrary<T>, otherwise: T, weight = 6) =>
		fc.oneof({ arbitrary: of, weight: 1 }, { arbitrary: fc.constant(otherwise), weight });
	const pairs = fc.array(fc.tuple(unit, unit), { maxLength: 2 });
	const place = fc.integer({ min: 0, max: count - 1 });
	const whole = fc.integer({ min: 0, max: 9 });
	return fc
		.record({
			gaps: each(rarely(fc.constant(true), false, 8)),
			chords: fc.array(fc.tuple(unit, unit), { maxLength: 4 }),
			values: fc.array(each(whole), { minLength: 1, maxLength: 2 }),
			tolerances: fc.array(rarely(fc.constant(null), 0.3 as number | null, 3), {
				minLength: 2,
				maxLength: 2,
			}),
			tolerance: fc.constantFrom(0.05, 0.1, 0.2, 0.34, 0.5, 0.66),
			today: each(rarely(fc.constant(-1), 0, 8)),
			owners: each(place),
			drift: fc.boolean(),
			bases: fc.array(rarely(unit, -1, 1), { minLength: count, maxLength: count }),
			kinds: fc.array(fc.integer({ min: 0, max: 11 }), { minLength: count, maxLength: count }),
			capacities: fc.array(fc.constantFrom(1, 1, 1, 0.5, 2), {
				minLength: count,
				maxLength: count,
			}),
			locks: each(rarely(place, -1, 9)),
			together: rarely(pairs, [], 2),
			apart: rarely(pairs, [], 3),
			cost: fc.option(each(whole)),
			reach: fc.constantFrom(null, null, 0, 1, 2),
		})
		.map((made) => ({
			graph: graphOf(units, made.gaps, made.chords),
			measures: made.values.map((values, m) => ({
				name: `load ${m}`,
				values: Float64Array.from(values),
				tolerance: made.tolerances[m] === null ? null : made.tolerance,
			})),
			today: Int32Array.from(made.today, (t, u) =>
				t < 0 ? -1 : made.drift ? made.owners[u] : Math.floor((u * count) / units),
			),
			territories: made.capacities.map((capacity, t) =>
				territory({
					base: made.bases.indexOf(made.bases[t]) === t ? made.bases[t] : -1,
					capacity,
					frozen: made.kinds[t] === 0,
					closing: made.kinds[t] === 1,
				}),
			),
			locks: Int32Array.from(made.locks),
			together: made.together,
			apart: made.apart.filter(([a, b]) => a !== b),
			cost: made.cost ? Float64Array.from(made.cost) : undefined,
			goal: 'fewest-moves' as const,
			reach: made.reach,
			seed: 1,
			effort: 'quick' as const,
		}));
}

/** A row of units with some links missing and a few links across. */
function graphOf(units: number, gaps: boolean[], chords: [number, number][]) {
	const row = gaps.flatMap((gap, u) => (gap || u === 0 ? [] : [[u - 1, u]]));
	const links = [...row, ...chords.filter(([a, b]) => a !== b)];
	return buildGraph(
		units,
		links.map((pair) => pair[0]),
		links.map((pair) => pair[1]),
	);
}

/** Every assignment of a small problem, one after the other in the same array. */
export function* everyAssignment({ graph, territories }: TerritoryProblem): Generator<Int32Array> {
	const assignment = new Int32Array(graph.count);
	for (;;) {
		yield assignment;
		let u = 0;
		while (u < graph.count && ++assignment[u] === territories.length) assignment[u++] = 0;
		if (u === graph.count) return;
	}
}
