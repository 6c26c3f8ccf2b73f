/**
 * How the regions of an earlier coverage go on in a later one. Plain JSON: it can be stored, sent and
 * corrected by hand (`decide`). Regions go by number in their coverage; keys and names stand beside them.
 */
export interface RegionMatch {
	before: MatchSide;
	after: MatchSide;
	/** every region of either side is in exactly one; in order of the first old region, then of the first new */
	groups: MatchGroup[];
	/** number of the group of each old region, and of each new one */
	groupOfOld: number[];
	groupOfNew: number[];
	links: MatchLinks;
}

/** The regions of one side, in the order of their coverage. */
export interface MatchSide {
	keys: string[];
	names: string[];
	km2: number[];
}

/**
 * What became of regions: `kept` one with the same key on mostly the same ground; `renamed` one on mostly
 * the same ground under another key; `split` one into several; `merged` several into one; `redrawn` several
 * into several others; `gone` none stands for it; `new` it stands for none.
 */
export type Outcome = 'kept' | 'renamed' | 'split' | 'merged' | 'redrawn' | 'gone' | 'new';

/** Regions that belong together across the re-cut. */
export interface MatchGroup {
	outcome: Outcome;
	/** numbers of the old regions, rising; none for `new` */
	before: number[];
	/** numbers of the new regions, rising; none for `gone` */
	after: number[];
	/** by the same key and ground in common, by ground alone, or by a person's decision */
	by: 'key' | 'area' | 'hand';
	/** share (0 to 1) of the old regions' area that the new ones of the group cover; 0 where there are none */
	shareOfOld: number;
	/** share (0 to 1) of the new regions' area that the old ones of the group covered */
	shareOfNew: number;
	/** a `kept` or `renamed` region is drawn otherwise than before; true for every other outcome */
	outlineChanged: boolean;
	/** false: somebody should look at it */
	sure: boolean;
	/** what happened, and what is doubted, in plain sentences that name regions by key */
	words: string;
}

/**
 * Pairs of an old and a new region that have ground in common, as columns; by old region, then by new.
 * Pairs with less in common than `thresholds.mention` of both are left out.
 */
export interface MatchLinks {
	from: number[];
	to: number[];
	/** area in common, square kilometres */
	km2: number[];
	/** share (0 to 1) of the old region's area, and of the new one's */
	shareOfOld: number[];
	shareOfNew: number[];
	/** true where the new region goes on from the old one; these links make the groups */
	joins: boolean[];
}

/** Where the lines are drawn. No published rule says where: the figures are our choice. */
export interface Thresholds {
	/**
	 * from this share of either region's area in common, the new one goes on from the old one; and so it
	 * does with the same key
	 */
	half: number;
	/** from this share of both areas in common, a match is sure */
	sure: number;
	/** what is less than this share of both areas is a border drawn a little otherwise, and not listed */
	mention: number;
	/** share of the area that may differ where an outline counts as not changed, as by one more corner on a line */
	unchanged: number;
}

export const thresholds: Readonly<Thresholds> = {
	half: 0.5,
	sure: 0.9,
	mention: 0.001,
	unchanged: 1e-6,
};
