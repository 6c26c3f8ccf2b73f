import type { DeskBoundarySet, DisplayLevelNote } from '$lib/schemas/desk';

/** Regions up to which a sheet is one inline SVG; above, a canvas keeps panning smooth. */
const mostInSvg = 4_000;
/** Points up to which an SVG is moved and repainted without a stutter. */
const mostPointsInSvg = 400_000;

/** Whether a sheet is shown on a canvas: many regions, or lines of very many points. */
export function showsOnCanvas({ regionCount, levels }: DeskBoundarySet): boolean {
	const finest = levels.at(-1);
	return regionCount > mostInSvg || (finest !== undefined && finest.points > mostPointsInSvg);
}

/**
 * Address of the geometry to draw first: for a canvas the coarsest level, because finer ones are laid in
 * as one looks closer; for an SVG, which is drawn once for all sizes, the finest.
 */
export function firstGeometry(sheet: string, set: DeskBoundarySet): string {
	const level = showsOnCanvas(set) ? set.levels[0] : set.levels.at(-1);
	return level ? levelAddress(sheet, level) : `${sheet}/geometry`;
}

export const levelAddress = (sheet: string, { level }: DisplayLevelNote): string =>
	`${sheet}/geometry?level=${level}`;

/**
 * The coarsest level whose left-out detail stays under a pixel of the screen; the finest where none does.
 * In: pixels of the screen to a metre on the ground. Null when the first level does, or there is no other.
 */
export function finerLevel(
	levels: readonly DisplayLevelNote[],
	pixelsPerMetre: number,
): DisplayLevelNote | null {
	const fine = levels.findIndex(({ toleranceMetres }) => toleranceMetres * pixelsPerMetre <= 1);
	const wanted = fine < 0 ? levels.length - 1 : fine;
	return wanted > 0 ? levels[wanted] : null;
}
