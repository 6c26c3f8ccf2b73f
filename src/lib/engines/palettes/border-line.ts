import { contrast } from '../colour/contrast.ts';

/** WCAG 2.2, success criterion 1.4.11: what a line needs against the fills on both its sides. */
export const lineContrastAsked = 3;

/**
 * How a border line stands against each ink it may lie between. At most three fills can be mutually
 * 3:1, so a map of four inks and more needs such lines.
 *
 * Out: the ratio for each ink, unrounded, and whether it reaches 3:1 (inclusive).
 * Throws a RangeError on text that is no colour.
 */
export function checkBorderLine(
	line: string,
	inks: readonly string[],
): { ink: number; contrast: number; passes: boolean }[] {
	return inks.map((hex, ink) => {
		const ratio = contrast(line, hex);
		return { ink, contrast: ratio, passes: ratio >= lineContrastAsked };
	});
}
