import { inducedSubgraph } from '../graph/subgraph.ts';
import { mayTake, setInk, type Board } from './board.ts';
import { listColouring } from './list-colouring.ts';

export interface BallOptions {
	/** inked regions in the first ball; doubled until one can be re-inked */
	first: number;
	/** balls larger than this are left to others */
	most: number;
	/** solver conflicts for one ball */
	conflicts: number;
	cancelled?: () => boolean;
}

/**
 * Inks `v` by re-inking a ball of free vertices around it, everything outside held fast; the ball
 * doubles until that is possible. Returns the size of the ball that did, or 0.
 */
export function inkByBall(board: Board, v: number, options: BallOptions): number {
	let reached = 0;
	for (let size = options.first; reached < size; size *= 2) {
		const limit = Math.min(size, options.most);
		const ball = ballAround(board, v, limit);
		if (reInk(board, ball, options)) return ball.length;
		if (ball.length <= reached || limit === options.most) return 0;
		reached = ball.length;
		size = Math.max(size, reached);
	}
	return 0;
}

/** `v` and the nearest free, inked vertices, breadth first. */
function ballAround({ graph, ink, fixed }: Board, v: number, size: number): number[] {
	const { offsets, targets } = graph;
	const seen = new Set([v]);
	const ball = [v];
	for (let head = 0; head < ball.length && ball.length <= size; head++) {
		for (let e = offsets[ball[head]]; e < offsets[ball[head] + 1]; e++) {
			const w = targets[e];
			if (seen.has(w) || ink[w] < 0 || (fixed !== null && fixed[w] >= 0)) continue;
			seen.add(w);
			ball.push(w);
		}
	}
	return ball;
}

function reInk(board: Board, ball: number[], options: BallOptions): boolean {
	const { graph, inks, ink } = board;
	const held = outsideInks(board, ball);
	const inner = listColouring(
		inducedSubgraph(graph, ball),
		{
			inks,
			allowed: (i, c) => !held[i].has(c) && mayTake(board, ball[i], c),
			hint: (i) => ink[ball[i]],
		},
		options,
	);
	if (typeof inner === 'string') return false;
	ball.forEach((v, i) => setInk(board, v, inner[i]));
	return true;
}

/** For each vertex of the ball the inks of its neighbours outside. */
function outsideInks({ graph, ink }: Board, ball: number[]): Set<number>[] {
	const inside = new Set(ball);
	return ball.map((v) => {
		const held = new Set<number>();
		for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
			const w = graph.targets[e];
			if (!inside.has(w) && ink[w] >= 0) held.add(ink[w]);
		}
		return held;
	});
}
