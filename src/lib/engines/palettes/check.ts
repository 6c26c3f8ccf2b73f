import { contrast, labelInk } from '../colour/contrast.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { appearanceOf, differenceFor, greyGap, type Appearance } from './appearance.ts';
import type { LabelVerdict, PairVerdict, PaletteVerdict, Thresholds, Touching } from './palette.ts';
import { touchingPairs } from './touching.ts';

/** 12 in CIEDE2000 is what regions of 5 to 10 mm ask; 4.5 is WCAG 2.2, success criterion 1.4.3. */
export const labelContrastAsked = 4.5;
export const defaultThresholds: Thresholds = {
	ciede2000: 12,
	grey: 5,
	label: labelContrastAsked,
};

/**
 * Checks a palette for every reader.
 *
 * In: inks as hex digits; the pairs that touch on the sheet, or all; thresholds (those absent are
 * `defaultThresholds`), all inclusive.
 * Out: a verdict per touching pair and reader (pairs by a then b, readers in their own order), a label
 * verdict per ink, and whether everything passes. `contrast` and `greyGap` are those of the two fills
 * themselves. A pair passes for grey print by its gap in L*, for the other readers by its CIEDE2000.
 * Throws a RangeError on text that is no colour and on pairs that do not exist.
 * Source: Machado et al. 2009; Sharma et al. 2005; WCAG 2.2.
 */
export function checkPalette(
	inks: readonly string[],
	touching: Touching,
	thresholds: Partial<Thresholds> = {},
): PaletteVerdict {
	const asked = { ...defaultThresholds, ...thresholds };
	const seen = inks.map(appearanceOf);
	const pairs = touchingPairs(inks.length, touching).flatMap(([a, b]) =>
		readers.map((reader) => ({
			...judgePair(reader, seen[a], seen[b], asked),
			...{ a, b, contrast: contrast(inks[a], inks[b]) },
		})),
	);
	const labels = inks.map((hex, ink) => judgeLabel(hex, ink, asked.label));
	return { pairs, labels, passes: [...pairs, ...labels].every((verdict) => verdict.passes) };
}

function judgePair(
	reader: Reader,
	one: Appearance,
	two: Appearance,
	asked: Thresholds,
): Pick<PairVerdict, 'reader' | 'ciede2000' | 'greyGap' | 'passes'> {
	const difference = differenceFor(reader, one, two);
	const gap = greyGap(one, two);
	const passes = reader === 'grey' ? gap >= asked.grey : difference >= asked.ciede2000;
	return { reader, ciede2000: difference, greyGap: gap, passes };
}

/** The better of black and white on an ink, and whether it reaches the contrast asked for. */
export function judgeLabel(hex: string, ink: number, asked: number): LabelVerdict {
	const label = labelInk(hex);
	const ratio = contrast(hex, label);
	return { ink, label, contrast: ratio, passes: ratio >= asked };
}
