/**
 * The widest minimum CIEDE2000 over four kinds of eyesight known for a number of inks that all touch,
 * with black labels at 4.5:1. Found by search, not proved: "best found" is all that may be said.
 */
export const bestKnown: ReadonlyMap<number, number> = new Map([
	[4, 36.2],
	[5, 27.3],
	[6, 25.0],
	[7, 21.7],
	[8, 19.9],
]);

/** Wide sets to start a search from, by number of inks. */
export const wideSets: readonly (readonly string[])[] = [
	['#a76354', '#7cfeff', '#fdf000', '#755fe8'],
	['#acfaee', '#a385ff', '#d5356c', '#e1c300'],
	['#ebb855', '#e5ecf0', '#648fdf', '#7a756a'],
	['#eeb756', '#e8ebee', '#787764', '#7099eb'],
	['#e6ecea', '#72b2ff', '#ac6500', '#8a8c8a', '#f0c961'],
	['#8dd7fd', '#e6b751', '#949292', '#697ed2', '#996d2d', '#e7eddf'],
	['#a19a98', '#6f7494', '#a9fdce', '#ae7244', '#dcdef5', '#91a0f9', '#e3b951'],
	['#676ec3', '#90818e', '#d9e0f7', '#8dffd0', '#e6c65c', '#87a9ff', '#ab7203', '#91a27f'],
];
