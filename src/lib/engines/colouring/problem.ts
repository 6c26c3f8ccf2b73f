/**
 * What is asked of the colouring engine and what it answers. Regions are numbered from 0 and so are
 * inks. The engine knows graphs, not maps: territories and categories are coloured by it as well.
 */
export interface ColouringProblem {
	regions: number;
	/** pairs of regions that must differ; doubles and either order are allowed, loops are not */
	borders: { a: ArrayLike<number>; b: ArrayLike<number> };
	/** a number of inks, or the smallest k for which inks 0..k-1 do */
	inks: number | 'fewest';
	/** ink of each locked region, -1 for free; all free when absent */
	locks?: Int32Array;
	/** what dropping each lock costs (1 each when absent); positive */
	lockCosts?: Float64Array;
	/** [region, ink] pairs that may not be */
	forbidden?: readonly (readonly [number, number])[];
	/** inks that a region has only when it, or a region kept alike with it, is locked to them */
	reserved?: readonly number[];
	alike?: readonly (readonly [number, number])[];
	apart?: readonly (readonly [number, number])[];
	/** an earlier colouring, -1 where a region had none */
	previous?: Int32Array;
	goal?: 'any' | 'fewest-changes' | 'even' | 'distinct';
	/** area or other weight of each region, for `even` (by count when absent) */
	areas?: Float64Array;
	/** metres of each entry of `borders`, for `distinct` */
	lengths?: ArrayLike<number>;
	/** distance between inks, for `distinct` */
	inkDistances?: readonly (readonly number[])[];
	seed?: number;
	effort?: 'quick' | 'normal' | 'thorough';
	/** so many times the steps of this effort, from 1 */
	effortTimes?: number;
	/**
	 * asked between steps, while a question is put to the solver with the conflicts it has taken so far;
	 * true ends the run with the best so far
	 */
	cancelled?: (conflicts?: number) => boolean;
	/** told whenever more is known: no fewer than so many inks do; so many do, or null while none is found */
	bounds?: (atLeast: number, enough: number | null) => void;
	progress?: (message: string, share: number) => void;
	/** told of every better release of colliding locks and every better bound, while it is worked out */
	releaseFound?: (soFar: Release) => void;
}

export type ProofKind =
	'none-needed' | 'edge' | 'odd-cycle' | 'clique' | 'odd-wheel' | 'refutation' | 'not-proved';

/**
 * Why no fewer inks do. `regions`: a clique in any order; an odd cycle in ring order; an odd wheel hub
 * first, then its rim in ring order; a refutation names the regions of the part that was refuted, with
 * DRUP clauses in which the variable of region i (1-based in that list) and ink c is (i-1)*inks + c + 1.
 */
export interface Proof {
	kind: ProofKind;
	regions: number[];
	/** the pairs among `regions` that a refutation needs; all of them when absent */
	borders?: [number, number][];
	refutation?: { inks: number; format: 'drup'; clauses: string };
}

export type Rule =
	| { kind: 'border' | 'alike' | 'apart'; a: number; b: number }
	| { kind: 'forbidden' | 'reserved'; region: number; ink: number }
	| { kind: 'inks'; inks: number };

export interface Release {
	/** regions whose locks are dropped */
	locks: number[];
	cost: number;
	/** true when no cheaper release exists */
	proved: boolean;
	lowerBound: number;
}

export interface Explanation {
	/** irreducible: together these locks collide, and without any single one they no longer do */
	locks: number[];
	/** rules to blame when no release of locks helps */
	rules: Rule[];
	/** the locked regions and those between them, for the sheet */
	regions: number[];
	release: Release | null;
	/** the smallest larger number of inks with all rules kept, or null if none */
	inksThatWouldDo: number | null;
}

export type ColouringResult =
	| {
			status: 'coloured';
			/** the k of `fewest`, else highest ink used + 1 */
			inksUsed: number;
			colouring: Int32Array;
			/** no colouring that keeps the rules has fewer inks */
			lowerBound: number;
			proof: Proof;
			changes?: { count: number; lowerBound: number };
			objective?: number;
	  }
	| { status: 'impossible'; explanation: Explanation }
	| { status: 'undecided'; lowerBound: number; message: string };
