import { buildGraph } from '../graph/build-graph.ts';
import type { RegionGraph } from '../graph/region-graph.ts';
import type { Board } from './board.ts';
import { metresOf } from './border-metres.ts';
import type { Prepared } from './prepare.ts';
import type { ColouringProblem } from './problem.ts';

/**
 * What goals are measured on: the regions themselves, whatever is kept alike or apart, in an order in
 * which the regions of one vertex follow each other and neighbours lie close in memory.
 */
export interface Ground {
	problem: ColouringProblem;
	prepared: Prepared;
	board: Board;
	/** places of vertex v: first[v] .. first[v + 1] - 1 */
	first: Uint32Array;
	/** the region at each place, and its vertex */
	regionAt: Uint32Array;
	vertexAt: Uint32Array;
	/** who borders whom, by place; pairs kept apart are no borders */
	borders: RegionGraph;
	/** metres of each entry of `borders.targets` */
	metres: () => Float64Array;
}

/** The ground of a problem whose board is inked. Linear time. */
export function groundOf(problem: ColouringProblem, prepared: Prepared, board: Board): Ground {
	const { vertexOf, graph } = prepared;
	const first = new Uint32Array(graph.count + 1);
	for (const v of vertexOf) first[v + 1]++;
	for (let v = 0; v < graph.count; v++) first[v + 1] += first[v];
	const next = first.slice(0, -1);
	const placeOf = vertexOf.map((v) => next[v]++);
	const regionAt = new Uint32Array(problem.regions);
	for (let r = 0; r < problem.regions; r++) regionAt[placeOf[r]] = r;
	const { a, b } = problem.borders;
	const at = (region: number) => placeOf[region];
	const borders = buildGraph(problem.regions, Array.from(a, at), Array.from(b, at));
	let metres: Float64Array | null = null;
	return {
		...{ problem, prepared, board, first, regionAt, borders },
		vertexAt: regionAt.map((region) => vertexOf[region]),
		metres: () =>
			(metres ??= metresOf(problem, { ...prepared, graph: borders, vertexOf: placeOf })),
	};
}

/** Inks that may carry an even share: all of the board's but those kept for locks. */
export function inksInPlay({ problem, board }: Ground): number[] {
	const reserved = new Set(problem.reserved ?? []);
	return Array.from({ length: board.inks }, (_, ink) => ink).filter((ink) => !reserved.has(ink));
}
