import polylabel from 'polylabel';
import { ringDoubleArea, ringPoints } from '../fills.ts';
import type { SheetArcs } from '../plane/quantise.ts';

export interface Pole {
	x: number;
	y: number;
	/** distance to the nearest border */
	radius: number;
}

function pairs(points: number[]): [number, number][] {
	const list: [number, number][] = [];
	for (let i = 0; i < points.length; i += 2) list.push([points[i], points[i + 1]]);
	return list;
}

/**
 * The place in a region furthest from its borders: the pole of inaccessibility of its largest part.
 * In: the region's rings, outer rings first in each part as in a coverage. Out: hundredths of a
 * millimetre, or null where the region has no ring. Source: V. Agafonkin, polylabel (ISC licence).
 */
export function poleOf(arcs: SheetArcs, rings: Int32Array[]): Pole | null {
	const outlines = rings.map((ring) => {
		const points = ringPoints(arcs, ring);
		return { points, area: ringDoubleArea(points) };
	});
	let largest = outlines[0];
	for (const outline of outlines)
		if (Math.abs(outline.area) > Math.abs(largest.area)) largest = outline;
	if (!largest) return null;
	const holes = outlines.filter(
		({ area, points }) => area * largest.area < 0 && within(largest.points, points[0], points[1]),
	);
	const polygon = [largest, ...holes].map(({ points }) => pairs(points));
	const precision = Math.max(10, Math.sqrt(Math.abs(largest.area)) / 60);
	const found = polylabel(polygon, precision);
	return { x: found[0], y: found[1], radius: found.distance };
}

function within(points: number[], x: number, y: number): boolean {
	let inside = false;
	for (let i = 0, j = points.length - 2; i < points.length; j = i, i += 2) {
		const [x0, y0, x1, y1] = [points[i], points[i + 1], points[j], points[j + 1]];
		if (y0 > y !== y1 > y && x < ((x1 - x0) * (y - y0)) / (y1 - y0) + x0) inside = !inside;
	}
	return inside;
}
