import { labOf } from '../colour/index.ts';
import type { Ramp } from './ramps.ts';

/** The lightest class stays clear of white paper and of the ground of "no data". */
const lightest = 90;
/** Below this a black line between two regions would be lost. */
const darkest = 24;
/** The middle of a diverging ramp may be lighter: it is told from "no data" by the hatch. */
const lightestMiddle = 92;
const steps = 256;

/**
 * A ramp's colours for classes from low to high, in equal steps of L*, so that grey print tells them apart
 * as well as the ramp allows.
 *
 * In: the number of classes, 1 or more; `reversed` turns it round. A sequential ramp runs from light to
 * dark. For a diverging ramp, `turn` says where it turns, counted in classes from 0: 2 between the second
 * and the third class, 2.5 in the third; both sides take equal steps, so that as far from the middle is as
 * dark. Out: as many `#rrggbb`; L* at most 92, at least 24 or the ramp's own.
 */
export function rampInks(
	ramp: Ramp,
	classes: number,
	{ reversed = false, turn = classes / 2 }: { reversed?: boolean; turn?: number } = {},
): string[] {
	if (ramp.kind === 'sequential') {
		const inks = sampled(ramp.at, evenly(classes), lightest);
		return reversed ? inks.reverse() : inks;
	}
	const at = reversed ? (share: number) => ramp.at(1 - share) : ramp.at;
	const middle = Math.min(classes, Math.max(0, turn));
	const furthest = Math.max(0.5, middle - 0.5, classes - 0.5 - middle);
	return Array.from({ length: classes }, (_, one) => {
		const away = one + 0.5 - middle;
		const side =
			away < 0 ? (share: number) => at(0.5 - share / 2) : (share: number) => at(0.5 + share / 2);
		return sampled(side, [Math.abs(away) / furthest], lightestMiddle)[0];
	});
}

const evenly = (classes: number): number[] =>
	Array.from({ length: classes }, (_, one) => (classes === 1 ? 0.5 : one / (classes - 1)));

/** Colours of one run at shares of the way from its lightest to its darkest allowed L*. */
function sampled(at: (share: number) => string, shares: number[], most: number): string[] {
	const run = Array.from({ length: steps + 1 }, (_, step) => {
		const hex = at(step / steps);
		return { hex, light: labOf(hex)[0] };
	}).sort((one, other) => other.light - one.light);
	const from = Math.min(most, run[0].light);
	const to = Math.max(darkest, run[steps].light);
	return shares.map((share) => nearest(run, from + (to - from) * share));
}

function nearest(run: { hex: string; light: number }[], light: number): string {
	const off = (one: { light: number }) => Math.abs(one.light - light);
	return run.reduce((best, one) => (off(one) < off(best) ? one : best)).hex;
}
