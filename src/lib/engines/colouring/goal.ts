import { newBoard, setInk, type Board } from './board.ts';
import { wishesOf } from './changes.ts';
import { metresOf } from './border-metres.ts';
import { distinctNeighbours } from './distinct.ts';
import { effortOf } from './effort.ts';
import { evenUse } from './even-use.ts';
import { fewestChanges } from './fewest-changes.ts';
import { byRegion, type Prepared } from './prepare.ts';
import type { ColouringProblem } from './problem.ts';

export interface GoalOutcome {
	ink: Int32Array;
	changes?: { count: number; lowerBound: number };
	objective?: number;
}

/** Moves a colouring with so many inks through proper colourings towards the goal of the problem. */
export function towardsGoal(
	problem: ColouringProblem,
	prepared: Prepared,
	ink: Int32Array,
	inks: number,
): GoalOutcome {
	const board = newBoard(prepared.graph, inks, prepared.fixed, prepared.bans);
	for (let v = 0; v < ink.length; v++) setInk(board, v, ink[v]);
	const effort = effortOf(problem);
	const moves = effort.movesEach * Math.max(1_000, prepared.graph.count);
	switch (problem.goal ?? 'any') {
		case 'any':
			return { ink };
		case 'fewest-changes':
			return changed(problem, prepared, board, effort.ballConflicts);
		case 'even':
			return even(problem, prepared, board, moves);
		case 'distinct':
			return distinct(problem, prepared, board, moves);
	}
}

function changed(problem: ColouringProblem, prepared: Prepared, board: Board, conflicts: number) {
	const wishes = wishesOf(problem, prepared, board.inks);
	const { seed = 0, cancelled, previous } = problem;
	const least = fewestChanges(board, wishes, { conflicts, seed, cancelled });
	const now = byRegion(prepared, board.ink);
	let count = 0;
	previous?.forEach((ink, r) => {
		if (ink >= 0 && ink !== now[r]) count++;
	});
	const lowerBound = wishes.compulsory + least;
	return { ink: board.ink, changes: { count, lowerBound }, objective: count };
}

function even(problem: ColouringProblem, prepared: Prepared, board: Board, moves: number) {
	const { seed = 0, cancelled } = problem;
	const objective = evenUse(board, loads(problem, prepared), { moves, seed, cancelled });
	return { ink: board.ink, objective };
}

function distinct(problem: ColouringProblem, prepared: Prepared, board: Board, moves: number) {
	const { seed = 0, cancelled, inkDistances } = problem;
	if (!inkDistances || inkDistances.length < board.inks) return { ink: board.ink };
	const metres = metresOf(problem, prepared);
	const objective = distinctNeighbours(board, metres, inkDistances, { moves, seed, cancelled });
	return { ink: board.ink, objective };
}

/** The weight of each vertex: the areas of its regions, or their number. */
function loads({ areas, regions }: ColouringProblem, { vertexOf, graph }: Prepared): Float64Array {
	const weights = new Float64Array(graph.count);
	for (let r = 0; r < regions; r++) weights[vertexOf[r]] += areas ? areas[r] : 1;
	return weights;
}
