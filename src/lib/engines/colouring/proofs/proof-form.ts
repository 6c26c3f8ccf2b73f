/**
 * The form of a proof file: what is claimed of a map, and what shows it, in one plain JSON document that
 * says everything a reader needs. Regions are named by their place in `regions`, counted from 0; inks
 * count from 0 as well. A reader refuses a form, field or claim that it does not know.
 */
export interface ProofFile {
	form: 'merestone proof 1';
	regions: { key: string; name?: string }[];
	/** pairs that must differ */
	borders: Pair[];
	rules: {
		/** [region, ink] that must be */
		locks: Pair[];
		/** [region, ink] that may not be */
		forbidden: Pair[];
		alike: Pair[];
		apart: Pair[];
		/** inks that only those regions may have that are locked to them, or kept alike with one that is */
		reserved: number[];
	};
	claims: Claim[];
}

export type Pair = readonly [number, number];

export type Claim =
	/** so many inks (from 0) do: this colouring keeps every border and rule */
	| { claim: 'inks do'; inks: number; colouring: number[] }
	/** so many inks do not: no colouring with them keeps every border and rule */
	| { claim: 'inks do not'; inks: number; evidence: Evidence }
	/** these locks cannot all be kept with so many inks, whatever becomes of the other locks */
	| { claim: 'cannot be kept'; inks: number | 'any'; locks: number[]; evidence: ClauseEvidence }
	/** with these locks dropped, this colouring keeps everything else with so many inks */
	| { claim: 'works without'; inks: number; locks: number[]; colouring: number[] };

export type Evidence = ShapeEvidence | ClauseEvidence;

/**
 * `one region` needs one ink; regions of a `clique` all border each other; those of an `odd ring` each
 * border the next and the last the first; an `odd wheel` is a hub and the odd ring round it.
 */
export interface ShapeEvidence {
	kind: 'one region' | 'clique' | 'odd ring' | 'odd wheel';
	regions: number[];
}

/**
 * Clauses that refute a colouring of some regions. With n `inks` written down, the variable of the i-th
 * region and the c-th ink (both from 1) is (i - 1) * n + c. Given are: each region has one of the inks;
 * two that border or are kept apart do not share one; two kept alike have the same; forbidden and
 * reserved inks; and the locks of the claim. `clauses` is a refutation of these in the DRUP text form.
 *
 * `inks` are all inks allowed or, of those that no rule names here and that are therefore alike, at least
 * as many as there are regions.
 */
export interface ClauseEvidence {
	kind: 'clauses';
	regions: number[];
	inks: number[];
	/** the pairs that the refutation needs among these regions; all when absent */
	borders?: Pair[];
	format: 'drup';
	clauses: string;
}
