import { ciede2000 } from '../colour/ciede2000.ts';
import type { Triple } from '../colour/hex.ts';
import { labOfLinear } from '../colour/lab.ts';
import { linearOf } from '../colour/srgb.ts';
import { tritanSecondOpinion } from '../colour/vision.ts';
import { appearanceOf, differenceFor } from './appearance.ts';
import { defaultThresholds } from './check.ts';
import type { Touching } from './palette.ts';
import { touchingPairs } from './touching.ts';

/** An ink as a tritan reader sees it by the older model, CIELAB D65. Throws on text that is no colour. */
export const secondOpinionOf = (hex: string): Triple =>
	labOfLinear(tritanSecondOpinion(linearOf(hex)));

/**
 * Pairs that pass for tritan readers by the model of the check, but not by the older one: worth a note,
 * as models of this deficiency differ most.
 *
 * In: as for `checkPalette`; `asked` in CIEDE2000, inclusive.
 * Out: the pairs with their difference by the second opinion, by a then b.
 * Source: Brettel, Vienot, Mollon 1997, beside Machado et al. 2009.
 */
export function tritanDoubts(
	inks: readonly string[],
	touching: Touching,
	asked = defaultThresholds.ciede2000,
): { a: number; b: number; ciede2000: number }[] {
	const first = inks.map(appearanceOf);
	const second = inks.map(secondOpinionOf);
	return touchingPairs(inks.length, touching)
		.map(([a, b]) => ({ a, b, ciede2000: ciede2000(second[a], second[b]) }))
		.filter(({ a, b, ciede2000: found }) => {
			return found < asked && differenceFor('tritan', first[a], first[b]) >= asked;
		});
}
