/**
 * One step that mends a fault of a file, replayed every time the file is read; the file itself is never
 * touched. Regions go by the key they have before any mend; places are degrees of longitude and latitude.
 */
export type Mend =
	/** nobody's land enclosed by regions (a sliver, a gap) is given to one of them */
	| { kind: 'fill'; at: [number, number]; into: string }
	/** what two regions both cover stays with one of them and is cut from the other */
	| { kind: 'settle'; a: string; b: string; keep: string }
	/** a region is left out, such as the second of two with the same outline */
	| { kind: 'drop'; key: string }
	/** a region becomes parts of another */
	| { kind: 'merge'; key: string; into: string }
	/** outlines that cross themselves are cut into parts that do not */
	| { kind: 'untangle'; key: string }
	/** one stray part is left out of a region, or given to another */
	| { kind: 'part'; key: string; at: [number, number]; into: string | null };

/** A mend that a finding offers, and what it would do in one sentence. */
export interface MendOffer {
	mend: Mend;
	words: string;
	/** the one that is taken when a whole kind of finding is mended at once */
	usual: boolean;
}
