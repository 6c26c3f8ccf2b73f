/**
 * A scale bar that is true. In: the scale of the map at its centre and at places all over the regions.
 * Out: a round ground length, its length on the sheet, and how far to trust it: plain where every
 * place is within 2 % of the centre, marked where within 10 %, none beyond (own rule of the house).
 */
import type { GroundScale } from '../plane/ground-scale.ts';

export interface ScaleBar {
	/** ground metres: 1, 2 or 5 with noughts */
	metres: number;
	/** hundredths of a millimetre */
	length: number;
	/** true at the centre only */
	atCentre: boolean;
}

export const plainWithin = 0.02;
export const markedWithin = 0.1;

/** Largest of 1, 2, 5, 10, 20, ... that is not above a value. */
export function roundLength(most: number): number {
	const power = 10 ** Math.floor(Math.log10(most));
	return [5, 2, 1].map((step) => step * power).find((step) => step <= most * (1 + 1e-9))!;
}

/** The greatest share by which any place is off the mean scale of the centre. */
export function scaleError(centre: number, places: GroundScale[]): number {
	return places.reduce(
		(worst, { across, down }) =>
			Math.max(worst, Math.abs(across / centre - 1), Math.abs(down / centre - 1)),
		0,
	);
}

export function scaleBar(
	centre: GroundScale,
	places: GroundScale[],
	longest: number,
): ScaleBar | null {
	const perUnit = Math.sqrt(centre.across * centre.down);
	const error = scaleError(perUnit, [centre, ...places]);
	if (error > markedWithin) return null;
	const metres = roundLength(longest * perUnit);
	return { metres, length: Math.round(metres / perUnit), atCentre: error > plainWithin };
}

/** A ground length in words: `25 km`, `500 m`. */
export function lengthWords(metres: number): { figure: string; unit: string } {
	const [figure, unit] = metres >= 1000 ? [metres / 1000, 'km'] : [metres, 'm'];
	return { figure: figure.toLocaleString('en-GB', { maximumFractionDigits: 1 }), unit };
}
