import type { Ink, Palette } from '../engines/palettes/palette.ts';

/** Who approved the inks of a palette, and when. */
export interface PaletteApproval {
	by: string;
	/** ISO 8601 */
	at: string;
	inks: Ink[];
	digest: string;
	/** the name the palette had */
	name: string;
	/** whether the palette still is what was approved */
	inForce: boolean;
}

/** A palette of the team's own as pages are given it. */
export interface TeamPalette extends Palette {
	revision: number;
	/** names the palette as it stands: of its name and its inks */
	digest: string;
	/** the one in force, else the last; null when it never was approved */
	approval: PaletteApproval | null;
}
