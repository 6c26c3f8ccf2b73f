import type { Coverage } from '../boundaries/coverage.ts';
import { collar } from './collar/collar.ts';
import { ringPoints } from './fills.ts';
import type { SheetLayout } from './layout.ts';
import type { SheetArcs } from './plane/quantise.ts';
import { placeOnPaper } from './place-on-paper.ts';

/** Smaller side of the largest ring's upright bounding box, in hundredths of a millimetre. */
export function smallerSide(arcs: SheetArcs, rings: Int32Array[]): number {
	let largest = 0;
	for (const ring of rings) {
		let [left, right, top, bottom] = [Infinity, -Infinity, Infinity, -Infinity];
		const points = ringPoints(arcs, ring);
		for (let i = 0; i < points.length; i += 2) {
			left = Math.min(left, points[i]);
			right = Math.max(right, points[i]);
			top = Math.min(top, points[i + 1]);
			bottom = Math.max(bottom, points[i + 1]);
		}
		largest = Math.max(largest, Math.min(right - left, bottom - top));
	}
	return largest;
}

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
	const { arcs, rings } = placeOnPaper(coverage, layout, () => measured.map);
	return Float64Array.from(rings, (list) => smallerSide(arcs, list) / 100);
}
