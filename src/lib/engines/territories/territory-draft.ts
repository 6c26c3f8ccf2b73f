/**
 * Everything people decide about the territories of a sheet, kept whole at every save so that any earlier
 * state can be read again. Regions and territories are named by their keys, measures by their ids.
 */
export interface TerritoryDraft {
	/** in the order of the list; keys are given once and never used again */
	territories: TerritoryEntry[];
	/** region key -> territory key; a region that is not named has none */
	assignment: Record<string, string>;
	/** region key -> territory it must end in, and why */
	locks: Record<string, { territory: string; reason: string }>;
	together: [string, string][];
	apart: [string, string][];
	/** pairs of regions across water that count as joined, of those the boundary set has */
	waterLinks: [string, string][];
	/** pairs joined by hand: a bridge, a ferry, a road through a third country */
	handLinks: { a: string; b: string; reason: string }[];
	wishes: Wishes;
}

export interface TerritoryEntry {
	key: string;
	name: string;
	/** who serves it; '' when vacant */
	person: string;
	/** where a handover list is sent; '' for none */
	email: string;
	/** region key of the home unit, or null */
	base: string | null;
	/** share of a full load, 1 = full time */
	capacity: number;
	frozen: boolean;
	/** nobody serves it at the time, and it stays */
	vacant: boolean;
	/** ends: all its regions are handed out */
	closing: boolean;
}

/** What a rebalance is asked for. */
export interface Wishes {
	/** measure id -> largest deviation allowed, 0.1 for 10 %; measures not named are free */
	tolerances: Record<string, number>;
	/** what a move costs: each unit 1, or the value of a measure (its id) */
	cost: 'units' | string;
	goal: 'fewest-moves' | 'least-deviation';
	/** 0 (none) to 1 */
	compactness: number;
	/** a unit goes no further than so many territories; null: no such rule */
	reach: number | null;
	seed: number;
	effort: 'quick' | 'normal' | 'thorough';
}

export const firstWishes: Wishes = {
	tolerances: {},
	cost: 'units',
	goal: 'fewest-moves',
	compactness: 0.15,
	reach: null,
	seed: 1,
	effort: 'normal',
};

/** A sheet before anybody saved territories for it. */
export const noTerritories: TerritoryDraft = {
	territories: [],
	assignment: {},
	locks: {},
	together: [],
	apart: [],
	waterLinks: [],
	handLinks: [],
	wishes: firstWishes,
};
