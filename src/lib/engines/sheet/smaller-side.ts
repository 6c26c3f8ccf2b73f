import { ringPoints } from './fills.ts';
import type { SheetArcs } from './plane/quantise.ts';

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
