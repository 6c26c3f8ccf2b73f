import type { AttemptSettings } from './attempt.ts';
import { ballOptions } from './attempt.ts';
import { inkByBall } from './ball.ts';
import { FreeInks, mayTake, newBoard, setInk, type Board } from './board.ts';
import { wishesOf } from './changes.ts';
import type { Prepared } from './prepare.ts';
import type { ColouringProblem } from './problem.ts';

/** Larger balls are left to the search from scratch. */
const largestBall = 400;

/**
 * The earlier colouring of a problem with as many inks as it has, re-inked in balls where it breaks a rule
 * by now; null where there is none, where it has no fewer than `fewerThan` inks, or where some ball cannot
 * be re-inked. So what a long search found is not lost with the next small change.
 */
export function mendedPrevious(
	problem: ColouringProblem,
	prepared: Prepared,
	settings: AttemptSettings,
	fewerThan: number,
): { inks: number; ink: Int32Array } | null {
	const { previous } = problem;
	const inks = previous ? previous.reduce((most, ink) => Math.max(most, ink + 1), 0) : 0;
	if (inks === 0 || inks >= fewerThan || inks < prepared.inksLocked) return null;
	const { graph, fixed, bans } = prepared;
	const board = newBoard(graph, inks, fixed, bans);
	const { old } = wishesOf(problem, prepared, inks);
	const options = { ...ballOptions(settings), most: largestBall };
	const free = new FreeInks(board);
	for (const v of bareAfter(board, old)) {
		if (board.ink[v] >= 0) continue;
		const ink = free.leastUsed(v);
		if (ink >= 0) setInk(board, v, ink);
		else if (inkByBall(board, v, options) === 0) return null;
	}
	return { inks, ink: board.ink };
}

/** Inks every vertex as it was where nothing forbids it; the vertices left without ink. */
function bareAfter(board: Board, old: Int32Array): number[] {
	const { offsets, targets } = board.graph;
	const bare: number[] = [];
	for (let v = 0; v < old.length; v++) {
		if (board.ink[v] >= 0) continue;
		let clash = old[v] < 0 || !mayTake(board, v, old[v]);
		for (let e = offsets[v]; e < offsets[v + 1] && !clash; e++) {
			clash = board.ink[targets[e]] === old[v];
		}
		if (clash) bare.push(v);
		else setInk(board, v, old[v]);
	}
	return bare;
}
