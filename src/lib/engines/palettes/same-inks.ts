import type { Ink } from './palette.ts';

/**
 * The inks of a palette in one text: equal exactly when number, names, values, hatches and what is fixed
 * are, in the same order. The order of members in memory or in a store does not count.
 */
export const inksText = (inks: readonly Ink[]): string =>
	JSON.stringify(
		inks.map(({ name, hex, hatch, fixed }) => [
			...[name, hex, fixed === true],
			hatch ? [hatch.kind, hatch.angle, hatch.spacingMm, hatch.widthMm, hatch.hex] : null,
		]),
	);

export const sameInks = (one: readonly Ink[], two: readonly Ink[]): boolean =>
	inksText(one) === inksText(two);
