import { inkByBall } from '../../src/lib/engines/colouring/ball.ts';
import { newBoard, type Board } from '../../src/lib/engines/colouring/board.ts';
import { checkColouring } from '../../src/lib/engines/colouring/check-colouring.ts';
import { colour } from '../../src/lib/engines/colouring/colour.ts';
import { kempe, type KempeStats } from '../../src/lib/engines/colouring/kempe.ts';
import type { ColouringProblem } from '../../src/lib/engines/colouring/problem.ts';
import { Random } from '../../src/lib/engines/colouring/random.ts';
import { buildGraph, smallestLastOrder } from '../../src/lib/engines/graph/index.ts';
import { fixtureGraph } from './named-graphs.ts';

export interface AnyMap {
	regions: number;
	borders: { a: ArrayLike<number>; b: ArrayLike<number> };
}

/** The maps on which Kempe's own argument fails. */
export const hardMaps = () => ['errera', 'kittell', 'poussin', 'fritsch'].map(fixtureGraph);

/**
 * Four inks, the vertices taken in a random order, which brings on many more impasses than
 * smallest-last; seed 0 keeps smallest-last. Balls follow where chains and walks fail.
 */
export function colourInOrder(
	map: AnyMap,
	seed: number,
	options: { chains: boolean; walk: number },
): { board: Board; stats: KempeStats } {
	const graph = buildGraph(map.regions, map.borders.a, map.borders.b);
	const board = newBoard(graph, 4);
	const random = new Random(seed);
	const { order } = smallestLastOrder(graph);
	for (let i = order.length - 1; seed > 0 && i > 0; i--) {
		const j = random.below(i + 1);
		[order[i], order[j]] = [order[j], order[i]];
	}
	const stuck = (at: Board, v: number) =>
		inkByBall(at, v, { first: 12, most: 100_000, conflicts: 20_000 }) > 0;
	return { board, stats: kempe(board, order, { ...options, seed, steps: Infinity, stuck }) };
}

/** The first fault of a board that should be a full, proper colouring, or null. */
export function properness({ graph, ink }: Board): string | null {
	for (let v = 0; v < graph.count; v++) {
		if (ink[v] < 0) return `Vertex ${v} has no ink.`;
		for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
			if (ink[graph.targets[e]] === ink[v]) return `Border ${v}-${graph.targets[e]}.`;
		}
	}
	return null;
}

/**
 * The map with rules that can all be kept: a third of the regions locked as in a colouring found in a random
 * order, on another third an ink forbidden that they do not have in it, a few pairs kept alike or apart.
 */
export function ruledProblem(map: AnyMap, seed: number): ColouringProblem {
	const { board } = colourInOrder(map, seed, { chains: true, walk: 1_000 });
	const inks = new Int32Array(map.regions);
	const graph = buildGraph(map.regions, map.borders.a, map.borders.b);
	for (let v = 0; v < graph.count; v++) inks[v] = board.ink[v];
	const random = new Random(seed);
	const locks = new Int32Array(map.regions).fill(-1);
	const forbidden: [number, number][] = [];
	const [alike, apart]: [number, number][][] = [[], []];
	for (let r = 0; r < map.regions; r++) {
		const part = random.below(3);
		if (part === 0) locks[r] = inks[r];
		if (part === 1) forbidden.push([r, (inks[r] + 1 + random.below(3)) % 4]);
		const other = random.below(map.regions);
		if (part < 2 || other === r || random.below(3) > 0) continue;
		(inks[r] === inks[other] ? alike : apart).push([r, other]);
	}
	return { ...map, inks: 4, locks, forbidden, alike, apart, seed };
}

/** What is wrong with the engine's colouring of a problem that has one, or null. */
export async function ruledFault(problem: ColouringProblem): Promise<string | null> {
	const result = await colour(problem);
	if (result.status !== 'coloured') return result.status;
	return checkColouring(problem, result)[0] ?? null;
}
