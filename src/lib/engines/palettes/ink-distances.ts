import { readers, type Reader } from '../colour/reader.ts';
import { appearanceOf, differenceFor } from './appearance.ts';

const eyes = readers.filter((reader) => reader !== 'grey');

/**
 * How far inks are apart for whoever sees them least apart: the least CIEDE2000 over the four kinds of
 * eyesight, ink by ink, 0 on the diagonal. For the goal `distinct` of the colouring engine, which keeps
 * the closest inks off each other's borders. Other readers can be named; for grey print it is the
 * difference of the greys that the inks print in, in CIEDE2000 too.
 * Throws a RangeError on text that is no colour.
 */
export function inkDistances(
	inks: readonly string[],
	seenBy: readonly Reader[] = eyes,
): number[][] {
	const seen = inks.map(appearanceOf);
	return seen.map((one) =>
		seen.map((two) => Math.min(...seenBy.map((reader) => differenceFor(reader, one, two)))),
	);
}
