import type { RegionGraph } from '../graph/region-graph.ts';
import type { TerritoryProblem } from './problem.ts';

/** Inclusive: a deviation of the tolerance itself is inside, whatever the last bit says. */
export const slack = 1e-9;

/** The problem as the searches use it: what follows from it at once, in flat arrays. */
export interface Prepared {
	problem: TerritoryProblem;
	graph: RegionGraph;
	units: number;
	territories: number;
	/** measures that have a tolerance; the columns of the arrays below are these */
	bound: number[];
	/** target of territory t for bound measure m: `targets[m * territories + t]`; 0 for one that closes */
	targets: Float64Array;
	/** load of bound measure m of unit u: `loads[m * units + u]` */
	loads: Float64Array;
	/** least and greatest load of bound measure m in territory t, slack included */
	least: Float64Array;
	greatest: Float64Array;
	/** territory a unit must end in (its base, its lock, its frozen territory), else -1 */
	fixed: Int32Array;
	/** 1 for a territory that may take and give units */
	open: Uint8Array;
	/** 1 for a territory that must stay (not closing) */
	stays: Uint8Array;
	/** unit -> block that moves as one (the closure of `together`); blocks are numbered from 0 */
	block: Int32Array;
	blocks: number[][];
	/** unit -> units it must be apart from */
	apart: Map<number, number[]>;
	/** cost of moving each unit */
	cost: Float64Array;
	/**
	 * steps on today's territory graph from territory a to b: `steps[a * territories + b]`, 255 beyond 254
	 * or unreachable; null without a reach rule
	 */
	steps: Uint8Array | null;
	/** `units` long: 1 for a unit whose move is compulsory */
	compulsory: Uint8Array;
}

/** Whether the rules on single units let `unit` end in `territory`. */
export function mayEndIn(prepared: Prepared, unit: number, territory: number): boolean {
	const { fixed, open, stays, problem, steps, territories } = prepared;
	if (fixed[unit] >= 0) return fixed[unit] === territory;
	if (!stays[territory] || !open[territory]) return false;
	const from = problem.today[unit];
	if (!steps || from < 0 || from === territory) return true;
	return steps[from * territories + territory] <= (problem.reach ?? Infinity);
}
