import type { RegionGraph } from '../graph/region-graph.ts';
import { newBoard } from './board.ts';
import type { Effort } from './effort.ts';
import type { Attempt } from './fewest.ts';
import { inkByBall } from './ball.ts';
import { kempe } from './kempe.ts';
import type { Prepared } from './prepare.ts';
import { wholeColouring } from './whole.ts';

export interface AttemptSettings {
	order: Uint32Array;
	sides: Int32Array | null;
	/** a clique, whose inks may be fixed beforehand */
	clique: number[];
	effort: Effort;
	seed: number;
	cancelled?: () => boolean;
}

/** A colouring with the given number of inks by chains and balls, or null when they found none. */
export function quickColouring(
	prepared: Prepared,
	inks: number,
	settings: AttemptSettings,
): Int32Array | null {
	const { graph, fixed, bans } = prepared;
	const ruled = fixed !== null || bans !== null;
	if (settings.sides && !ruled && inks >= 2) return settings.sides.slice();
	if (inks < prepared.inksLocked) return null;
	const board = newBoard(graph, inks, fixed, bans);
	const stats = kempe(board, settings.order, {
		seed: settings.seed,
		walk: settings.effort.walk,
		steps: chainBudget(graph, settings.effort),
		cancelled: settings.cancelled,
		stuck: (at, v) => inkByBall(at, v, ballOptions(settings)) > 0,
	});
	return stats.finished ? board.ink : null;
}

export function chainBudget(graph: RegionGraph, effort: Effort): number {
	return effort.chainSteps + effort.chainStepsEach * graph.count;
}

/** The first ball holds twelve inked regions, as measured to do nearly always. */
export function ballOptions({ effort, cancelled }: AttemptSettings) {
	const { ballConflicts, ballSize } = effort;
	return { first: 12, most: ballSize, conflicts: ballConflicts, cancelled };
}

/** The answer of the solver on the whole map. */
export function exactColouring(
	prepared: Prepared,
	inks: number,
	{ effort, clique, cancelled }: AttemptSettings,
): Attempt {
	const answer = wholeColouring(prepared, inks, {
		conflicts: effort.wholeConflicts,
		size: effort.solverSize,
		clique,
		cancelled,
	});
	if (answer === 'unsat') return { status: 'refuted' };
	return answer === 'unknown' ? { status: 'unknown' } : { status: 'coloured', ink: answer };
}
