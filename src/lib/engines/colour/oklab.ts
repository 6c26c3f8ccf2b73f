import type { Triple } from './hex.ts';
import { hexOfLinear, linearOf, times } from './srgb.ts';

// Source: Ottosson 2020, "A perceptual color space for image processing", sRGB matrices of 2021-01-25.
const toCones = [
	0.4122214708, 0.5363325363, 0.0514459929, 0.2119034982, 0.6806995451, 0.1073969566, 0.0883024619,
	0.2817188376, 0.6299787005,
];
const conesToLab = [
	0.2104542553, 0.793617785, -0.0040720468, 1.9779984951, -2.428592205, 0.4505937099, 0.0259040371,
	0.7827717662, -0.808675766,
];
const labToCones = [
	1, 0.3963377774, 0.2158037573, 1, -0.1055613458, -0.0638541728, 1, -0.0894841775, -1.291485548,
];
const fromCones = [
	4.0767416621, -3.3077115913, 0.2309699292, -1.2684380046, 2.6097574011, -0.3413193965,
	-0.0041960863, -0.7034186147, 1.707614701,
];

/** OKLab of a colour in hex digits: L 0 to 1, a and b about -0.4 to 0.4. Throws on text that is no colour. */
export function oklabOf(hex: string): Triple {
	return oklabOfLinear(linearOf(hex));
}

/** OKLab of linear sRGB; channels outside 0 to 1 are allowed. */
export function oklabOfLinear(linear: Triple): Triple {
	const [l, m, s] = times(toCones, linear);
	return times(conesToLab, [Math.cbrt(l), Math.cbrt(m), Math.cbrt(s)]);
}

/** Linear sRGB of an OKLab colour; channels outside 0 to 1 mean that the screen cannot show it. */
export function linearOfOklab(oklab: Triple): Triple {
	const [l, m, s] = times(labToCones, oklab);
	return times(fromCones, [l ** 3, m ** 3, s ** 3]);
}

/** The nearest `#rrggbb` by clipping each channel. */
export function hexOfOklab(oklab: Triple): string {
	return hexOfLinear(linearOfOklab(oklab));
}
