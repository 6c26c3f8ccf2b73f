import type { Reader } from '../colour/reader.ts';

export { readers, type Reader } from '../colour/reader.ts';

export interface Ink {
	name: string;
	/** sRGB, `#rrggbb`, lower case */
	hex: string;
	/** drawn over the colour, so that the ink is told without hue */
	hatch?: Hatch;
	/** belongs to a brand: a mend leaves it as it is */
	fixed?: true;
}

/** Lines drawn across every region of an ink, cut at its borders. */
export interface Hatch {
	kind: 'lines' | 'crossed';
	/** degrees against the horizontal, anticlockwise, 0 to 179 */
	angle: number;
	/** from one line to the next, mm on the sheet */
	spacingMm: number;
	widthMm: number;
	/** colour of the lines, `#rrggbb` */
	hex: string;
}

export interface Palette {
	/** stable and url-safe */
	id: string;
	name: string;
	inks: Ink[];
	/** where the values were published, and under which licence */
	source?: string;
	licence?: string;
}

/** What is asked of two inks that touch, and of a label on its ink. */
export interface Thresholds {
	/** least CIEDE2000 for every reader but grey print, 0 to 100 */
	ciede2000: number;
	/** least difference in L* for grey print, 0 to 100 */
	grey: number;
	/** least WCAG contrast of the label ink, 1 to 21 */
	label: number;
}

/** Pairs of ink numbers that touch on the sheet, in any order, or every pair. */
export type Touching = readonly (readonly [number, number])[] | 'all';

export interface PairVerdict {
	/** ink numbers, a < b */
	a: number;
	b: number;
	reader: Reader;
	/** difference as this reader sees it, Lab D65 */
	ciede2000: number;
	/** WCAG 2.2 contrast ratio of the two fills, unrounded */
	contrast: number;
	/** difference in L* */
	greyGap: number;
	passes: boolean;
}

export interface LabelVerdict {
	ink: number;
	label: '#000000' | '#ffffff';
	contrast: number;
	passes: boolean;
}

export interface PaletteVerdict {
	pairs: PairVerdict[];
	labels: LabelVerdict[];
	passes: boolean;
}

/** A border on this sheet that one kind of reader could miss. */
export interface WeakBorder {
	/** index into the sheet's border list */
	border: number;
	reader: Reader;
	/** what was found and what was asked, in CIEDE2000 or, for grey print, in L* */
	found: number;
	asked: number;
	severity: 'error' | 'warning';
}
