import type { RegionGraph } from '../graph/region-graph.ts';

/**
 * What is asked of the territories engine and what it answers. Basic units (regions) and territories are
 * numbered from 0. The engine knows a graph and numbers, not maps: what joins two units (a line border, a
 * chosen water link, a link made by hand) is decided before.
 */
export interface TerritoryProblem {
	/** which units count as joined */
	graph: RegionGraph;
	measures: Measure[];
	/** territory of each unit today, -1 where it has none yet */
	today: Int32Array;
	territories: Territory[];
	/** unit -> territory it is pinned to, -1 for free; absent: none */
	locks?: Int32Array;
	/** pairs of units that must end in one territory */
	together?: readonly (readonly [number, number])[];
	/** pairs of units that must end in two */
	apart?: readonly (readonly [number, number])[];
	/** what moving each unit costs, >= 0; absent: 1 each */
	cost?: Float64Array;
	goal: 'fewest-moves' | 'least-deviation';
	/** weight of cut borders against moves, 0 (none) to 1; absent: 0.15 */
	compactness?: number;
	/**
	 * a unit may only go to territories whose area today, its base included, lies within so many steps, 0 to
	 * 254; null: no such rule. Binds neither units without a territory today nor units that are locked,
	 * frozen, a base, or tied together with one of these.
	 */
	reach: number | null;
	/** whole number from 0 to 2^32 - 1 */
	seed: number;
	effort: 'quick' | 'normal' | 'thorough';
}

export interface Measure {
	name: string;
	/** one value a unit, >= 0 and finite; anything else is the answer `missing-value` */
	values: Float64Array;
	/** largest deviation allowed, 0.1 for 10 %, inclusive; null: free */
	tolerance: number | null;
}

export interface Territory {
	/** unit that stays in it and roots its contiguity, -1 for none */
	base: number;
	/** share of a full load, > 0 */
	capacity: number;
	/** keeps exactly the units of today */
	frozen: boolean;
	/** ends empty and has no target */
	closing: boolean;
}

export interface Move {
	unit: number;
	/** -1: had none */
	from: number;
	to: number;
	/** a leaver's unit, a unit without a territory, or one torn from its own area today */
	compulsory: boolean;
}

export type Reason =
	| 'unit-too-heavy'
	| 'lock-cut-off'
	| 'frozen-outside-tolerance'
	| 'island-load'
	| 'missing-value'
	| 'no-plan';

/** The smallest change that would help, in the terms of the problem. */
export type Relief =
	| { kind: 'tolerance'; measure: number; value: number }
	| { kind: 'unlock'; unit: number }
	| { kind: 'unfreeze'; territory: number }
	| { kind: 'split'; unit: number };

export interface Impossible {
	status: 'impossible';
	reason: Reason;
	/** plain sentence with numbers of units as #12 and of territories as @3, for the caller to put names in */
	message: string;
	/** enough to see by oneself that it cannot be done */
	witness: { units: number[]; territories: number[] };
	relief: Relief[];
}

export interface Plan {
	/** territory of every unit, never -1 */
	assignment: Int32Array;
	moves: Move[];
	/** of every move, compulsory ones too */
	cost: number;
	compulsoryCost: number;
	/** for each measure, (load - target)/target of each territory; NaN for one that closes */
	deviations: Float64Array[];
	/** joined pairs of units in two territories */
	cutBorders: { before: number; after: number };
}

export interface Proposed extends Plan {
	status: 'proposed';
	/** no plan that keeps the rules costs less */
	lowerBound: number;
	/** true when `cost` is the least possible (for the goal fewest-moves) */
	proved: boolean;
}

export interface Undecided {
	status: 'undecided';
	/** the plan that came nearest, outside some tolerance; contiguous and true to every lock */
	best: Plan | null;
	lowerBound: number;
	/** says by how much it fails */
	message: string;
}

export type RebalanceResult = Proposed | Impossible | Undecided;

export interface Watch {
	/** what is being done, and how far the whole is, 0 to 1 */
	progress?: (step: string, share: number) => void;
	/** asked between steps; true ends the run with the best so far */
	cancelled?: () => boolean;
}
