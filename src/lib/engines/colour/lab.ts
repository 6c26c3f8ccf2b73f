import type { Triple } from './hex.ts';
import { linearOf, times } from './srgb.ts';

/** Linear sRGB to CIE XYZ, D65. Source: IEC 61966-2-1, in the exact fractions of CSS Color 4. */
const toXyz = [
	506752 / 1228815,
	87881 / 245763,
	12673 / 70218,
	87098 / 409605,
	175762 / 245763,
	12673 / 175545,
	7918 / 409605,
	87881 / 737289,
	1001167 / 1053270,
];

/** D65 from its chromaticity 0.3127, 0.3290, so that white has no hue. */
const white: Triple = [0.3127 / 0.329, 1, (1 - 0.3127 - 0.329) / 0.329];

const epsilon = 216 / 24389;
const kappa = 24389 / 27;

function compress(share: number): number {
	return share > epsilon ? Math.cbrt(share) : (kappa * share + 16) / 116;
}

/**
 * CIELAB with white D65 from linear sRGB (0 to 1).
 * Out: L* 0 to 100, a*, b*. Source: CIE 15:2004; the constants as exact fractions (CIE, Lindbloom).
 */
export function labOfLinear(linear: Triple): Triple {
	const [x, y, z] = times(toXyz, linear);
	const [fx, fy, fz] = [compress(x / white[0]), compress(y / white[1]), compress(z / white[2])];
	return [116 * fy - 16, 500 * (fx - fy), 200 * (fy - fz)];
}

/** CIELAB D65 of a colour in hex digits. Throws on text that is no colour. */
export function labOf(hex: string): Triple {
	return labOfLinear(linearOf(hex));
}

/** CIE luminance of linear sRGB, 0 to 1. */
export function luminanceY(linear: Triple): number {
	return times(toXyz, linear)[1];
}
