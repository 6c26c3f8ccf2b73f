/** What stands beside the map, besides title, credits, scale bar and the caution. */
export interface CollarLook {
	legendAt: 'foot' | 'left' | 'right';
	legendTitle: string;
	/** how many regions have each ink */
	legendCounts: boolean;
	blocks: TextBlock[];
	/** the team's template it was set by, which two sheets of a series share */
	template: { id: string; name: string } | null;
}

/** A text anywhere on the sheet, its upper left corner in mm. */
export interface TextBlock {
	text: string;
	xMm: number;
	yMm: number;
	widthMm: number;
	sizePt: number;
	face: 'sans' | 'sans-bold' | 'serif' | 'serif-bold' | 'serif-italic';
	/** a white ground under it */
	ground: boolean;
}

export const plainCollar: CollarLook = {
	legendAt: 'foot',
	legendTitle: '',
	legendCounts: false,
	blocks: [],
	template: null,
};
