import { ciede2000 } from '../colour/ciede2000.ts';
import type { Triple } from '../colour/hex.ts';
import { labOfLinear } from '../colour/lab.ts';
import { readers, type Reader } from '../colour/reader.ts';
import { linearOf } from '../colour/srgb.ts';
import { seenLinear } from '../colour/vision.ts';

/** One ink as every reader sees it, CIELAB D65, in the order of `readers`. */
export type Appearance = readonly Triple[];

const grey = readers.indexOf('grey');

/** In: a colour in hex digits. The simulated values are not rounded to 8 bits before they are measured. */
export function appearanceOf(hex: string): Appearance {
	const linear = linearOf(hex);
	return readers.map((reader) => labOfLinear(seenLinear(linear, reader)));
}

/** CIEDE2000 of two inks for one reader. */
export function differenceFor(reader: Reader, one: Appearance, two: Appearance): number {
	const place = readers.indexOf(reader);
	return ciede2000(one[place], two[place]);
}

/** Difference in L* of two inks, as grey print shows it. */
export function greyGap(one: Appearance, two: Appearance): number {
	return Math.abs(one[grey][0] - two[grey][0]);
}

/** What counts for a reader: the gap in L* for grey print, CIEDE2000 for the others. */
export function found(reader: Reader, one: Appearance, two: Appearance): number {
	return reader === 'grey' ? greyGap(one, two) : differenceFor(reader, one, two);
}
