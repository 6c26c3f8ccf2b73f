import { inkByBall } from '../../src/lib/engines/colouring/ball.ts';
import { newBoard, type Board } from '../../src/lib/engines/colouring/board.ts';
import { kempe, type KempeStats } from '../../src/lib/engines/colouring/kempe.ts';
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
