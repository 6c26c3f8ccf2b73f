import type { GoalWish } from './goal-wish.ts';
import type { ColouringProblem } from './problem.ts';

/** What a colouring comes to for one goal. `cost` is what the improver makes small, in its own measure. */
export type GoalFigure = { cost: number } & (
	| { kind: 'fewest-changes'; changed: number; of: number }
	| { kind: 'even-count' | 'even-area'; loads: { ink: number; load: number }[] }
	| {
			kind: 'distinct';
			/** the least distance between two inks that share a line, the pair, and the metres along it */
			smallest: { a: number; b: number; distance: number; metres: number } | null;
			/** mean distance across all shared metres; null where none are shared */
			mean: number | null;
	  }
	| { kind: 'same-ink-apart'; pairs: number }
);

/**
 * What a colouring comes to for each of the goals, read from the problem's own lists. Shares no code with
 * the improver, whose figures it is held against.
 *
 * In: a problem without faults, an ink for every region, the number of inks that may be used. Out: one
 * figure for each wish, in the same order.
 */
export function goalFigures(
	problem: ColouringProblem,
	colouring: ArrayLike<number>,
	wishes: readonly GoalWish[],
	inks: number,
): GoalFigure[] {
	return wishes.map(({ kind }) => {
		switch (kind) {
			case 'fewest-changes':
				return changesFigure(problem, colouring);
			case 'even-count':
			case 'even-area':
				return evenFigure(problem, colouring, kind, inks);
			case 'distinct':
				return distinctFigure(problem, colouring, inks);
			case 'same-ink-apart':
				return apartFigure(problem, colouring);
		}
	});
}

function changesFigure({ previous }: ColouringProblem, colouring: ArrayLike<number>): GoalFigure {
	let changed = 0;
	let of = 0;
	previous?.forEach((ink, region) => {
		if (ink < 0) return;
		of++;
		if (colouring[region] !== ink) changed++;
	});
	return { kind: 'fewest-changes', changed, of, cost: changed };
}

function evenFigure(
	{ areas, reserved = [], regions }: ColouringProblem,
	colouring: ArrayLike<number>,
	kind: 'even-count' | 'even-area',
	inks: number,
): GoalFigure {
	const loads: { ink: number; load: number }[] = [];
	for (let ink = 0; ink < inks; ink++) {
		if (reserved.includes(ink)) continue;
		let load = 0;
		for (let region = 0; region < regions; region++) {
			if (colouring[region] === ink) load += kind === 'even-area' && areas ? areas[region] : 1;
		}
		loads.push({ ink, load });
	}
	const mean = loads.reduce((sum, { load }) => sum + load, 0) / loads.length;
	return { kind, loads, cost: loads.reduce((sum, { load }) => sum + (load - mean) ** 2, 0) };
}

function distinctFigure(
	{ borders, lengths, inkDistances = [] }: ColouringProblem,
	colouring: ArrayLike<number>,
	inks: number,
): GoalFigure {
	const along = new Float64Array(inks * inks);
	let metres = 0;
	let weighted = 0;
	for (let i = 0; i < borders.a.length; i++) {
		const c = Math.min(colouring[borders.a[i]], colouring[borders.b[i]]);
		const d = Math.max(colouring[borders.a[i]], colouring[borders.b[i]]);
		const length = lengths ? lengths[i] : 1;
		along[c * inks + d] += length;
		metres += length;
		weighted += length * (inkDistances[c]?.[d] ?? 0);
	}
	const pairs = pairsOf(inks).map(([a, b]) => {
		const distance = inkDistances[a]?.[b] ?? 0;
		return { a, b, distance, metres: along[a * inks + b] };
	});
	pairs.sort((one, other) => one.distance - other.distance);
	const distances = [...new Set(pairs.map(({ distance }) => distance))];
	const weight = (distance: number) => 1 / 64 ** distances.indexOf(distance);
	return {
		kind: 'distinct',
		smallest: pairs.find((pair) => pair.metres > 0) ?? null,
		mean: metres > 0 ? weighted / metres : null,
		cost: pairs.reduce((sum, pair) => sum + pair.metres * weight(pair.distance), 0),
	};
}

function pairsOf(inks: number): [number, number][] {
	const pairs: [number, number][] = [];
	for (let a = 0; a < inks; a++) for (let b = a + 1; b < inks; b++) pairs.push([a, b]);
	return pairs;
}

function apartFigure(
	{ borders, regions }: ColouringProblem,
	colouring: ArrayLike<number>,
): GoalFigure {
	const neighbours = Array.from({ length: regions }, () => new Set<number>());
	for (let i = 0; i < borders.a.length; i++) {
		neighbours[borders.a[i]].add(borders.b[i]);
		neighbours[borders.b[i]].add(borders.a[i]);
	}
	let pairs = 0;
	for (const some of neighbours) {
		const inks = new Map<number, number>();
		for (const region of some) inks.set(colouring[region], (inks.get(colouring[region]) ?? 0) + 1);
		for (const count of inks.values()) pairs += (count * (count - 1)) / 2;
	}
	return { kind: 'same-ink-apart', pairs, cost: pairs };
}
