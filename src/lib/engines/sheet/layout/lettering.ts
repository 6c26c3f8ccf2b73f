/** How names are set on the map. Regions are named by their key. */
export interface Lettering {
	/** whose name comes first where not all fit */
	priority: 'area' | 'neighbours';
	/** points; null: as suits the sheet */
	sizePt: number | null;
	/** names of the level above as well */
	groupNames: boolean;
	/** region key -> what is set where the whole name does not fit */
	abbreviations: Record<string, string>;
	/** region key -> middle of the name, mm from the upper left of the sheet */
	placed: Record<string, { xMm: number; yMm: number }>;
	/** keys whose name is not set */
	hidden: string[];
	/** a number stands where no name fits, and the list says whose it is */
	numbers: boolean;
}

export const plainLettering: Lettering = {
	priority: 'area',
	sizePt: null,
	groupNames: true,
	abbreviations: {},
	placed: {},
	hidden: [],
	numbers: false,
};
