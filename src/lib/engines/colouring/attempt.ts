import type { RegionGraph } from '../graph/region-graph.ts';
import { newBoard } from './board.ts';
import type { Effort } from './effort.ts';
import { kempe } from './kempe.ts';
import type { Prepared } from './prepare.ts';

export interface AttemptSettings {
	order: Uint32Array;
	sides: Int32Array | null;
	effort: Effort;
	seed: number;
	cancelled?: () => boolean;
}

/** A colouring with the given number of inks by chains alone, or null when they did not find one. */
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
	});
	return stats.finished ? board.ink : null;
}

export function chainBudget(graph: RegionGraph, effort: Effort): number {
	return effort.chainSteps + effort.chainStepsEach * graph.count;
}
