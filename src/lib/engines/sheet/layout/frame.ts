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

export const plainFrame: FrameLayout = {
	parallels: null,
	centre: null,
	ratio: null,
	shiftMm: [0, 0],
	insets: 'none',
	graticule: null,
	northArrow: false,
	neatLine: false,
	sea: null,
	lakes: null,
};
