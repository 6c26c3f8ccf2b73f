import type { Coverage } from '../boundaries/coverage.ts';
import { collar } from './collar/collar.ts';
import type { SheetLayout } from './layout.ts';
import { placeOnPaper } from './place-on-paper.ts';
import { smallerSide } from './smaller-side.ts';

/**
 * How large every region shows on the sheet: the smaller side, in mm, of the bounding box of its
 * largest part. For the palette check, where small areas ask for colours further apart. 0 for a
 * region too small to be drawn.
 */
export function regionSizesMm(coverage: Coverage, layout: SheetLayout): Float64Array {
	const measured = collar({
		layout,
		inks: [],
		coloured: false,
		weak: false,
		projection: '',
		issue: '',
	});
	const { arcs, rings } = placeOnPaper(coverage, layout, () => measured);
	return Float64Array.from(rings, (list) => smallerSide(arcs, list) / 100);
}
