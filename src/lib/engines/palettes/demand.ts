/** Below this, a difference in CIEDE2000 is an error whatever the size of the regions. */
export const alikeBelow = 5;
/** Grey print: a gap in L* below the first is worth a warning, from the second on it is safe. */
export const greyWarnBelow = 5;
export const greySafeFrom = 8;
/** Regions shown smaller than this are not told apart by their fill alone. */
export const fillAloneFromMm = 3.5;

/**
 * The CIEDE2000 that two touching fills must reach, by the printed size of the smaller region in mm.
 * 10 from 10 mm on, 12 from 5 mm, 15 below. Under 3.5 mm no fill is enough by itself: see
 * `needsLabelOrHatch`.
 * Source: derived from the size model of Stone, Szafir and Setlur 2014 (22nd Color and Imaging
 * Conference) for the worst 5 % of pairs; there is no single published minimum.
 */
export function demandFor(smallerSideMm: number): number {
	if (smallerSideMm >= 10) return 10;
	return smallerSideMm >= 5 ? 12 : 15;
}

/** Whether a region of this printed size needs its border line and a label or a hatch besides its fill. */
export function needsLabelOrHatch(smallerSideMm: number): boolean {
	return smallerSideMm < fillAloneFromMm;
}
