/** How borders are drawn, by rank: the outer edge, the level above (province), regions (district). */
export interface LineLook {
	outer: RankLook | null;
	group: RankLook | null;
	region: RankLook | null;
	/** whether borders that a reader could miss are drawn as a double line */
	doubleWeak: boolean;
}

/** null in its place: as suits the sheet */
export interface RankLook {
	widthMm: number;
	hex: string;
	/** mm of line and gap in turn; empty: a whole line */
	dashMm: number[];
}

export const plainLines: LineLook = { outer: null, group: null, region: null, doubleWeak: false };
