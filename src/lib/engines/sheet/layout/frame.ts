/** How the map lies on the paper: projection, scale, insets, the ground around it. */
export interface FrameLayout {
	/** of the chosen projection, degrees; null: as suits the extent */
	parallels: [number, number] | null;
	/** longitude and latitude, degrees; null: as suits the extent */
	centre: [number, number] | null;
	/** one to so many; null: as large as fits */
	ratio: number | null;
	/** how far the map is moved from the middle of its box, mm right and down */
	shiftMm: [number, number];
	/** whether parts far off are set into boxes of their own */
	insets: 'none' | 'auto';
	/** what is decided by hand for a group of parts, by its name: see `Island.id` in insets/islands.ts */
	insetChoices: Record<string, InsetChoice>;
	/** degrees from one line to the next; null: none is drawn */
	graticule: { step: number | 'auto'; figures: boolean } | null;
	/** drawn only where it is honest */
	northArrow: boolean;
	/** a line round the map */
	neatLine: boolean;
	/** `#rrggbb` around the regions, and in gaps that regions enclose; null: paper */
	sea: string | null;
	lakes: string | null;
}

export interface InsetChoice {
	/** in the map's own frame, in a box of its own, or not on the sheet; null: as is chosen for it */
	place: 'frame' | 'box' | 'out' | null;
	/** upper left corner of its box on the paper, mm; null: where there is room */
	cornerMm: [number, number] | null;
	/** one to so many; null: a round figure that fits */
	ratio: number | null;
	/** written over its box; null: the names of its regions */
	name: string | null;
}

export const plainFrame: FrameLayout = {
	parallels: null,
	centre: null,
	ratio: null,
	shiftMm: [0, 0],
	insets: 'none',
	insetChoices: {},
	graticule: null,
	northArrow: false,
	neatLine: false,
	sea: null,
	lakes: null,
};
