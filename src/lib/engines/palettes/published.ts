import { readInks } from './ink-text.ts';
import type { Palette } from './palette.ts';

interface Origin {
	source: string;
	licence: string;
}

// that these three state no licence is from memory
const okabeIto: Origin = {
	source: 'Okabe and Ito 2008, Color Universal Design',
	licence: 'None stated; the values were published for anyone to use',
};
const tol: Origin = {
	source: 'Tol, Colour Schemes, SRON/EPS/TN/09-002 issue 3.2, 2021',
	licence: 'None stated; the values were published for anyone to use',
};
const petroff: Origin = {
	source: 'Petroff 2021, Accessible color sequences for data visualization, arXiv:2107.02270',
	licence: 'None stated; the values were published for anyone to use',
};
const brewer: Origin = {
	source:
		'Brewer, Harrower and the Pennsylvania State University, in the npm package colorbrewer 1.7.0',
	licence: 'Apache-2.0',
};

function published(origin: Origin, id: string, name: string, inks: string): Palette {
	return { id, name, inks: readInks(inks), ...origin };
}

/**
 * Palettes for kinds (not for amounts) as published, in their published order. The names of the inks
 * are those of the publication for Okabe and Ito and for Tol, plain words of our own for the others.
 */
export const publishedPalettes: readonly Palette[] = [
	published(
		okabeIto,
		'okabe-ito',
		'Okabe and Ito',
		'000000 Black, e69f00 Orange, 56b4e9 Sky blue, 009e73 Bluish green, f0e442 Yellow, 0072b2 Blue, d55e00 Vermilion, cc79a7 Reddish purple',
	),
	published(
		tol,
		'tol-bright',
		'Tol, bright',
		'4477aa Blue, ee6677 Red, 228833 Green, ccbb44 Yellow, 66ccee Cyan, aa3377 Purple, bbbbbb Grey',
	),
	published(
		tol,
		'tol-high-contrast',
		'Tol, high-contrast',
		'004488 Blue, ddaa33 Yellow, bb5566 Red',
	),
	published(
		tol,
		'tol-vibrant',
		'Tol, vibrant',
		'ee7733 Orange, 0077bb Blue, 33bbee Cyan, ee3377 Magenta, cc3311 Red, 009988 Teal, bbbbbb Grey',
	),
	published(
		tol,
		'tol-muted',
		'Tol, muted',
		'cc6677 Rose, 332288 Indigo, ddcc77 Sand, 117733 Green, 88ccee Cyan, 882255 Wine, 44aa99 Teal, 999933 Olive, aa4499 Purple',
	),
	published(
		tol,
		'tol-medium-contrast',
		'Tol, medium-contrast',
		'eecc66 Light yellow, ee99aa Light red, 6699cc Light blue, 997700 Dark yellow, 994455 Dark red, 004488 Dark blue',
	),
	published(
		tol,
		'tol-pale',
		'Tol, pale',
		'bbccee Pale blue, cceeff Pale cyan, ccddaa Pale green, eeeebb Pale yellow, ffcccc Pale red, dddddd Pale grey',
	),
	published(
		tol,
		'tol-light',
		'Tol, light',
		'77aadd Light blue, ee8866 Orange, eedd88 Light yellow, ffaabb Pink, 99ddff Light cyan, 44bb99 Mint, bbcc33 Pear, aaaa00 Olive, dddddd Pale grey',
	),
	published(
		petroff,
		'petroff-6',
		'Petroff, six',
		'5790fc Blue, f89c20 Orange, e42536 Red, 964a8b Plum, 9c9ca1 Grey, 7a21dd Violet',
	),
	published(
		petroff,
		'petroff-8',
		'Petroff, eight',
		'1845fb Deep blue, ff5e02 Orange, c91f16 Red, c849a9 Orchid, adad7d Khaki, 86c8dd Light blue, 578dff Blue, 656364 Dark grey',
	),
	published(
		petroff,
		'petroff-10',
		'Petroff, ten',
		'3f90da Blue, ffa90e Amber, bd1f01 Red, 94a4a2 Grey, 832db6 Violet, a96b59 Clay, e76300 Orange, b9ac70 Khaki, 717581 Slate, 92dadd Aqua',
	),
	published(
		brewer,
		'brewer-set2',
		'Brewer, Set2',
		'66c2a5 Sea green, fc8d62 Salmon, 8da0cb Periwinkle, e78ac3 Pink, a6d854 Lime, ffd92f Yellow, e5c494 Sand, b3b3b3 Grey',
	),
	published(
		brewer,
		'brewer-dark2',
		'Brewer, Dark2',
		'1b9e77 Teal, d95f02 Burnt orange, 7570b3 Violet, e7298a Magenta, 66a61e Green, e6ab02 Mustard, a6761d Brown, 666666 Dark grey',
	),
	published(
		brewer,
		'brewer-paired',
		'Brewer, Paired',
		'a6cee3 Light blue, 1f78b4 Blue, b2df8a Light green, 33a02c Green, fb9a99 Light red, e31a1c Red, fdbf6f Light orange, ff7f00 Orange, cab2d6 Light violet, 6a3d9a Violet, ffff99 Light yellow, b15928 Brown',
	),
	published(
		brewer,
		'brewer-set1',
		'Brewer, Set1',
		'e41a1c Red, 377eb8 Blue, 4daf4a Green, 984ea3 Purple, ff7f00 Orange, ffff33 Yellow, a65628 Brown, f781bf Pink, 999999 Grey',
	),
	published(
		brewer,
		'brewer-set3',
		'Brewer, Set3',
		'8dd3c7 Aqua, ffffb3 Pale yellow, bebada Lavender, fb8072 Coral, 80b1d3 Blue, fdb462 Apricot, b3de69 Lime, fccde5 Pale pink, d9d9d9 Pale grey, bc80bd Purple, ccebc5 Pale green, ffed6f Yellow',
	),
	published(
		brewer,
		'brewer-pastel1',
		'Brewer, Pastel1',
		'fbb4ae Pale red, b3cde3 Pale blue, ccebc5 Pale green, decbe4 Pale violet, fed9a6 Pale orange, ffffcc Pale yellow, e5d8bd Pale brown, fddaec Pale pink, f2f2f2 Pale grey',
	),
	published(
		brewer,
		'brewer-pastel2',
		'Brewer, Pastel2',
		'b3e2cd Pale teal, fdcdac Pale orange, cbd5e8 Pale blue, f4cae4 Pale pink, e6f5c9 Pale lime, fff2ae Pale yellow, f1e2cc Pale brown, cccccc Pale grey',
	),
	published(
		brewer,
		'brewer-accent',
		'Brewer, Accent',
		'7fc97f Green, beaed4 Lavender, fdc086 Apricot, ffff99 Yellow, 386cb0 Blue, f0027f Magenta, bf5b17 Brown, 666666 Dark grey',
	),
];
