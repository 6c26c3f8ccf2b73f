import { banned } from './bans.ts';
import type { Ground } from './improve-ground.ts';
import { inksInPlay } from './improve-ground.ts';
import { listColouring } from './list-colouring.ts';

/** Vertices times inks that are put to the solver, and the conflicts it may meet. */
const largest = 250_000;
const conflicts = 20_000;

/** The two inks that are least apart, and whether they need touch at all. */
export interface WeakestPair {
	a: number;
	b: number;
	distance: number;
	avoidable: 'yes' | 'no' | 'unknown';
	/** a proper colouring, by vertex, in which they do not touch */
	without: Int32Array | null;
}

/**
 * Whether the weakest pair of inks can be kept off each other's borders entirely: exactly when the map can
 * be coloured with the two counted as one ink, each region of it then taking whichever of the two it may
 * have. Decided by the solver within a budget of conflicts; `unknown` past that.
 */
export function weakestPair(ground: Ground): WeakestPair {
	const { a, b, distance } = closest(ground);
	const pair = { a, b, distance, without: null };
	const { board, prepared } = ground;
	const { graph, fixed, bans } = prepared;
	if (a < 0 || graph.count * board.inks > largest) return { ...pair, avoidable: 'unknown' };
	const may = (v: number, ink: number) =>
		fixed && fixed[v] >= 0 ? fixed[v] === ink : !banned(bans, v, ink);
	const merged = listColouring(
		graph,
		{
			inks: board.inks,
			allowed: (v, ink) => (ink === b ? false : may(v, ink) || (ink === a && may(v, b))),
			hint: (v) => (board.ink[v] === b ? a : board.ink[v]),
		},
		{ conflicts },
	);
	if (merged === 'unsat') return { ...pair, avoidable: 'no' };
	if (merged === 'unknown') return { ...pair, avoidable: 'unknown' };
	const without = merged.map((ink, v) => (ink === a && !may(v, a) ? b : ink));
	return { ...pair, avoidable: 'yes', without };
}

function closest(ground: Ground): Pick<WeakestPair, 'a' | 'b' | 'distance'> {
	const { inkDistances = [] } = ground.problem;
	const inks = inksInPlay(ground);
	let least = { a: -1, b: -1, distance: Infinity };
	for (const b of inks) {
		for (const a of inks) {
			const distance = inkDistances[a]?.[b] ?? Infinity;
			if (a < b && distance < least.distance) least = { a, b, distance };
		}
	}
	return least;
}
