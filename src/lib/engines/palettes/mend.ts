import { ciede2000 } from '../colour/ciede2000.ts';
import { readHex } from '../colour/hex.ts';
import { labOf } from '../colour/lab.ts';
import { checkPalette, defaultThresholds } from './check.ts';
import { flatAsks, mendTask } from './mend-cost.ts';
import { whyImpossible, whyNotFound } from './mend-reasons.ts';
import { smallestMend } from './mend-sets.ts';
import type { Thresholds, Touching } from './palette.ts';
import { randomStream } from './random.ts';
import { touchingPairs } from './touching.ts';

export interface MendRequest {
	inks: readonly string[];
	touching: Touching;
	/** numbers of the inks that stay as they are; none when absent */
	locked?: readonly number[];
	thresholds?: Partial<Thresholds>;
	seed?: number;
}

export interface MendResult {
	status: 'mended' | 'not-needed' | 'impossible' | 'not-found';
	/** the mended inks; the given ones unless mended */
	inks: string[];
	/** how far each ink moved, CIEDE2000 for a typical reader; 0 for one that stayed */
	moves: number[];
	/** a plain sentence, for `impossible` (certain) and `not-found` (the search ended without one) */
	reason?: string;
}

/**
 * Moves the fewest inks, and those the least, until the palette passes `checkPalette`.
 *
 * In: as for `checkPalette`, the locked inks and a seed.
 * Out: `mended` only when `checkPalette` passes on the new inks; locked inks are untouched. That fewer
 * or smaller moves would not do is not proved. Deterministic; the effort is counted in steps.
 * Throws a RangeError on text that is no colour and on inks that do not exist.
 * Method: every set of inks that meets all failing pairs, by size, is searched in OKLab by annealing
 * from where the inks stand and from wide sets known beforehand.
 */
export function mendPalette(request: MendRequest): MendResult {
	const inks = request.inks.map((hex) => readHex(hex) ?? hex);
	const asked = { ...defaultThresholds, ...request.thresholds };
	const locked = lockedInks(inks.length, request.locked ?? []);
	const stay = { inks, moves: inks.map(() => 0) };
	if (checkPalette(inks, request.touching, asked).passes) return { status: 'not-needed', ...stay };

	const pairs = flatAsks(touchingPairs(inks.length, request.touching), asked);
	const task = mendTask(inks, inks, pairs, asked.label);
	const never = whyImpossible(task, locked);
	if (never) return { status: 'impossible', ...stay, reason: never };

	const mended = smallestMend(task, locked, randomStream(request.seed ?? 0));
	if (!mended || !checkPalette(mended.inks, request.touching, asked).passes) {
		return { status: 'not-found', ...stay, reason: whyNotFound(task, locked) };
	}
	return { status: 'mended', inks: mended.inks, moves: movesBetween(inks, mended.inks) };
}

/** The locked inks, each once, ascending. Throws a RangeError on numbers that are no inks. */
export function lockedInks(count: number, locked: readonly number[]): number[] {
	for (const ink of locked) {
		if (!Number.isInteger(ink) || ink < 0 || ink >= count) {
			throw new RangeError(`No ink ${ink} among ${count}`);
		}
	}
	return [...new Set(locked)].sort((a, b) => a - b);
}

/** How far each ink moved, CIEDE2000 for a typical reader; 0 for one that stayed. */
export function movesBetween(before: readonly string[], after: readonly string[]): number[] {
	return before.map((hex, ink) =>
		hex === after[ink] ? 0 : ciede2000(labOf(hex), labOf(after[ink])),
	);
}
