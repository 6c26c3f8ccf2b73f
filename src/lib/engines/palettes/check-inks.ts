import { checkPalette } from './check.ts';
import { hatchesTell } from './hatch-tells.ts';
import type { Ink, PaletteVerdict } from './palette.ts';

/** In regions of 5 to 10 mm, which the usual demand of 12 is for, the smallest shows so much of a hatch. */
const smallestMm = 5;

/**
 * A palette on its own, before any sheet: as `checkPalette` of all its inks with the usual thresholds, but two
 * inks whose hatches tell them apart pass for whoever sees so, as they would on a sheet (`hatchesTell`).
 */
export function checkInks(inks: readonly Ink[]): PaletteVerdict {
	const verdict = checkPalette(
		inks.map(({ hex }) => hex),
		'all',
	);
	const pairs = verdict.pairs.map((pair) => ({
		...pair,
		passes:
			pair.passes || hatchesTell(inks[pair.a], inks[pair.b], pair.reader, [smallestMm, smallestMm]),
	}));
	const passes = [...pairs, ...verdict.labels].every((one) => one.passes);
	return { ...verdict, pairs, passes };
}
