import { weakBorders } from '../palettes/weak-borders.ts';
import type { WeakBorder } from '../palettes/palette.ts';
import type { SheetInput } from './draw-sheet.ts';
import { regionSizesMm } from './sizes.ts';

/**
 * The borders of a sheet to be drawn as a double line: none unless the layout asks for it, else those that
 * some reader could miss at the size in which their regions are printed. In: the borders that count, as they
 * will be given to the drawing. Out: see `weakBorders`.
 */
export function doubledBorders({
	coverage,
	borders,
	colouring,
	inks,
	layout,
}: Pick<SheetInput, 'coverage' | 'borders' | 'colouring' | 'inks' | 'layout'>): WeakBorder[] {
	if (!layout.lines.doubleWeak || !colouring) return [];
	return weakBorders({
		borders,
		colouring,
		inks: inks.map(({ hex }) => hex),
		hatches: inks.map(({ hatch }) => hatch),
		sizesMm: regionSizesMm(coverage, layout, inks),
	});
}
