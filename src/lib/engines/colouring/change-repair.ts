import { setInk, FreeInks, type Board } from './board.ts';
import { solveCluster, type Cluster } from './change-cluster.ts';
import type { ChangeSettings } from './fewest-changes.ts';
import { keptAt, type Wishes } from './changes.ts';
import { Random } from './random.ts';

/** Balls re-solved afterwards for each clash, and the vertices in one. */
const polishEach = 8;
const polishSize = 40;

/**
 * Repairs the old inks locally: of each clash one end gives way, and is inked again with the fewest
 * changes in a ball whose surroundings are held. Leaves the board as it was when some ball cannot.
 */
export function repairChanges(
	board: Board,
	wishes: Wishes,
	old: Int32Array,
	{ conflicts, seed, cancelled }: ChangeSettings,
): void {
	const before = board.ink.slice();
	for (let v = 0; v < old.length; v++) setInk(board, v, old[v]);
	const gaveWay = giveWay(board);
	const free = new FreeInks(board);
	const limits = { conflicts, cancelled };
	for (const v of gaveWay) {
		if (board.ink[v] >= 0) continue;
		const ink = free.leastUsed(v);
		if (ink >= 0) setInk(board, v, ink);
		else if (!inkClosest(board, wishes, v, limits)) {
			for (let w = 0; w < before.length; w++) setInk(board, w, before[w]);
			return;
		}
	}
	const random = new Random(seed);
	for (let i = 0; i < polishEach * gaveWay.length && !cancelled?.(); i++) {
		const centre = gaveWay[random.below(gaveWay.length)];
		reSolve(board, wishes, ballAround(board, centre, polishSize), limits);
	}
}

/** Takes the ink off one end of every clash, those with most clashes first; the ends without ink. */
function giveWay(board: Board): number[] {
	const { graph, ink, fixed } = board;
	const clashes = (v: number) => {
		let count = 0;
		for (let e = graph.offsets[v]; e < graph.offsets[v + 1]; e++) {
			if (ink[graph.targets[e]] === ink[v]) count++;
		}
		return count;
	};
	const found: { v: number; count: number }[] = [];
	const bare: number[] = [];
	for (let v = 0; v < graph.count; v++) {
		if (ink[v] < 0) bare.push(v);
		else if (!fixed || fixed[v] < 0) {
			const count = clashes(v);
			if (count > 0) found.push({ v, count });
		}
	}
	found.sort((p, q) => q.count - p.count || p.v - q.v);
	for (const { v } of found) {
		if (clashes(v) === 0) continue;
		setInk(board, v, -1);
		bare.push(v);
	}
	return bare;
}

type Limits = Pick<ChangeSettings, 'conflicts' | 'cancelled'>;

function inkClosest(board: Board, wishes: Wishes, v: number, limits: Limits): boolean {
	for (let size = 12, reached = 0; reached < size; size *= 2) {
		const ball = ballAround(board, v, size);
		if (reSolve(board, wishes, ball, limits)) return true;
		if (ball.length <= reached) return false;
		reached = ball.length;
	}
	return false;
}

/** Inks the ball with the fewest changes its surroundings allow; false when that was not found. */
function reSolve(board: Board, wishes: Wishes, ball: number[], limits: Limits): boolean {
	const vertices = new Set(ball);
	const { conflicts, cancelled } = limits;
	const cluster: Cluster = { vertices, inks: null, cost: 0, open: true, conflicts, search: null };
	solveCluster(board, wishes, cluster, board.ink, cancelled);
	const { inks } = cluster;
	if (!inks) return false;
	const kept = (v: number, ink: number) => {
		for (const [wished, regions] of keptAt(wishes, v)) if (wished === ink) return regions;
		return 0;
	};
	let gain = 0;
	for (const [v, ink] of inks) {
		if (board.ink[v] < 0) gain = Infinity;
		gain += kept(v, ink) - kept(v, board.ink[v]);
	}
	if (gain > 0) for (const [v, ink] of inks) setInk(board, v, ink);
	return true;
}

function ballAround({ graph, fixed }: Board, v: number, size: number): number[] {
	const { offsets, targets } = graph;
	const seen = new Set([v]);
	const ball = [v];
	for (let head = 0; head < ball.length && ball.length <= size; head++) {
		for (let e = offsets[ball[head]]; e < offsets[ball[head] + 1]; e++) {
			const w = targets[e];
			if (seen.has(w) || (fixed && fixed[w] >= 0)) continue;
			seen.add(w);
			ball.push(w);
		}
	}
	return ball;
}
