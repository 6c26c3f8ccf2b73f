import type { Coverage } from '../boundaries/coverage.ts';
import type { Ink } from '../palettes/palette.ts';
import { collar } from './collar/collar.ts';
import type { SheetLayout } from './layout.ts';
import { placeOnPaper } from './place-on-paper.ts';
import { smallerSide } from './smaller-side.ts';

/**
 * How large every region shows on the sheet: the smaller side, in mm, of the bounding box of its
 * largest part. For the palette check, where small areas ask for colours further apart. 0 for a
 * region too small to be drawn. A legend beside the map takes of its width, so its inks count there.
 */
export function regionSizesMm(
	coverage: Coverage,
	layout: SheetLayout,
	inks: readonly Ink[] = [],
): Float64Array {
	const beside = layout.collar.legendAt === 'left' || layout.collar.legendAt === 'right';
	const measured = collar({
		layout,
		inks: inks.map((ink) => ({ ...ink, shown: ink.hex })),
		coloured: beside && inks.length > 0,
		weak: new Set(),
		regions: coverage.keys.length,
		projection: '',
		issue: '',
	});
	const { arcs, rings } = placeOnPaper(coverage, layout, () => measured);
	return Float64Array.from(rings, (list) => smallerSide(arcs, list) / 100);
}
