import { linearOf } from './srgb.ts';

/**
 * Relative luminance, 0 (black) to 1 (white), of a colour in hex digits.
 * Source: WCAG 2.2, definition of relative luminance.
 */
export function luminance(hex: string): number {
	const [red, green, blue] = linearOf(hex);
	return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/**
 * Contrast ratio of two colours, 1 to 21, whichever comes first. Never rounded: 4.499 is below 4.5.
 * Source: WCAG 2.2, definition of contrast ratio and note on success criterion 1.4.3.
 */
export function contrast(hexA: string, hexB: string): number {
	const [a, b] = [luminance(hexA), luminance(hexB)];
	return (Math.max(a, b) + 0.05) / (Math.min(a, b) + 0.05);
}

/** Black or white, whichever reads better on this fill; the ratio is always at least 4.58. */
export function labelInk(hex: string): '#000000' | '#ffffff' {
	return contrast(hex, '#000000') >= contrast(hex, '#ffffff') ? '#000000' : '#ffffff';
}
