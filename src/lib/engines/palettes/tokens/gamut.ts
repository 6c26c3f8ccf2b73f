import type { Triple } from '../../colour/hex.ts';
import { linearOfOklab, oklabOfLinear } from '../../colour/oklab.ts';

/** Half a step of 8 bits, roughly: less than this beyond 0 or 1 is rounding of the file. */
const slack = 0.001;

export const inGamut = (linear: Triple): boolean =>
	linear.every((channel) => channel >= -slack && channel <= 1 + slack);

/**
 * The nearest sRGB colour of the same lightness and hue in OKLCH: chroma is halved towards grey until sRGB
 * can show it. Black and white for lightness at or beyond the ends. Deterministic, 40 halvings.
 * Source: the idea of gamut mapping in CSS Color Module Level 4, section 13, without its local clipping.
 */
export function intoGamut(linear: Triple): Triple {
	if (inGamut(linear)) return linear;
	const [l, a, b] = oklabOfLinear(linear);
	if (l >= 1) return [1, 1, 1];
	if (l <= 0) return [0, 0, 0];
	let [shown, beyond] = [0, 1];
	for (let step = 0; step < 40; step++) {
		const share = (shown + beyond) / 2;
		if (inGamut(linearOfOklab([l, share * a, share * b]))) shown = share;
		else beyond = share;
	}
	return linearOfOklab([l, shown * a, shown * b]);
}
