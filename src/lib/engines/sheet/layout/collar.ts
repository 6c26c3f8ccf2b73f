/** What stands beside the map, besides title, credits, scale bar and the caution. */
export interface CollarLook {
	/** 'corner': in the emptiest corner of the map, or at the foot where all are taken */
	legendAt: 'foot' | 'left' | 'right' | 'corner';
	legendTitle: string;
	/** null: as many as suit the names */
	legendColumns: number | null;
	/** by number, by name, or those of most regions first */
	legendOrder: 'number' | 'name' | 'regions';
	/** how many regions have each ink */
	legendCounts: boolean;
	/** what each rank of line stands for */
	legendLines: boolean;
	/** in place of the usual words; empty: as usual */
	lineNames: { outer: string; group: string; region: string };
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
	legendColumns: null,
	legendOrder: 'number',
	legendCounts: false,
	legendLines: false,
	lineNames: { outer: '', group: '', region: '' },
	blocks: [],
	template: null,
};
