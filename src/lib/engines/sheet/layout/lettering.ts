/** How names are set on the map. Regions are named by their key. */
export interface Lettering {
	/** whose name comes first where not all fit */
	priority: 'area' | 'neighbours';
	/** keys whose names come before all others, in this order */
	first: string[];
	/** points, for regions; null: as suits the sheet */
	sizePt: number | null;
	/** points, for the level above; null: as suits the sheet */
	groupSizePt: number | null;
	/** names of the level above as well */
	groupNames: boolean;
	/** column of the attribute table whose text is the name; null: the sheet's own names */
	nameColumn: string | null;
	/** region key -> what is set where the whole name does not fit */
	abbreviations: Record<string, string>;
	/** region key -> where its name stands by hand */
	placed: Record<string, PlacedName>;
	/** keys whose name is not set */
	hidden: string[];
	/** a number stands where no name fits, and the list says whose it is */
	numbers: boolean;
}

/**
 * A name set by hand: its middle, mm right of and below the region's anchor, so that it stays with its
 * region when paper, projection or fit change.
 */
export interface PlacedName {
	dxMm: number;
	dyMm: number;
	/** in how many lines; null: as is narrowest within three */
	lines: 1 | 2 | 3 | null;
	/** whether the abbreviation is set */
	short: boolean;
}

export const plainLettering: Lettering = {
	priority: 'area',
	first: [],
	sizePt: null,
	groupSizePt: null,
	groupNames: true,
	nameColumn: null,
	abbreviations: {},
	placed: {},
	hidden: [],
	numbers: false,
};

/** Smaller type is told as hard to read. Common practice, no source. */
export const leastLegiblePt = 5;
