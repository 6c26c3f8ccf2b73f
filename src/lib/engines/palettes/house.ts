import { readInks } from './ink-text.ts';
import type { Palette } from './palette.ts';

function house(id: string, name: string, inks: string): Palette {
	return { id, name, inks: readInks(inks), source: 'Merestone', licence: 'CC0-1.0' };
}

/**
 * The palettes a team starts with, calm enough for map fills, the first one being the default.
 * Every pair of inks in each passes `checkPalette` as it stands: the least CIEDE2000 over the four
 * kinds of eyesight is 29.6, 27.8, 25.1, 22.7, 19.3 and 17.5 in turn, the least gap in L* 10.2, 13.9,
 * 8.4, 5.2, 5.0 and 5.0.
 * Found by search in OKLab for the widest minimum over the four kinds of eyesight.
 */
export const housePalettes: readonly Palette[] = [
	house('house-four', 'House four', 'ebb855 Ochre, e5ecf0 Chalk, 648fdf Slate blue, 7a756a Flint'),
	house(
		'house-four-grey',
		'House four for grey print',
		'eeb756 Barley, e8ebee Chalk, 787764 Lichen, 7099eb Harebell',
	),
	house(
		'house-five',
		'House five',
		'e6ecea Chalk, 72b2ff Sky blue, ac6500 Leather, 8a8c8a Pewter, f0c961 Straw',
	),
	house(
		'house-six',
		'House six',
		'8dd7fd Ice blue, e6b751 Ochre, 949292 Pewter, 697ed2 Cornflower, 996d2d Bronze, e7eddf Chalk',
	),
	house(
		'house-seven',
		'House seven',
		'9e9795 Stone, 6d7191 Slate, a9fdce Mint, ae7244 Copper, dadbf2 Frost, 91a0f9 Harebell, e3b951 Ochre',
	),
	house(
		'house-eight',
		'House eight',
		'676ec3 Iris, 90818e Heather, d3dbf2 Frost, 8dffd0 Mint, e6c65c Straw, 87a9ff Cornflower, 905f00 Bronze, 91a27f Lichen',
	),
];
