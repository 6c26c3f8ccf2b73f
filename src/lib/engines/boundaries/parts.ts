import { sideOfRing } from '../geometry/rings.ts';
import type { TracedRing } from './traced-ring.ts';

/** Groups the rings of a region into parts: each outer ring, largest first, followed by its holes. */
export function groupParts(rings: TracedRing[]): TracedRing[][] {
	if (rings.length === 1 && rings[0].doubleArea > 0) return [rings];
	const outers = rings.filter((ring) => ring.doubleArea > 0);
	outers.sort((a, b) => b.doubleArea - a.doubleArea);
	const parts = outers.map((outer) => [outer]);
	for (const hole of rings) {
		if (hole.doubleArea < 0) ownerOf(hole, parts)?.push(hole);
	}
	return parts;
}

/** The smallest outer ring around a hole: parts come largest first, so the last that fits. */
function ownerOf(hole: TracedRing, parts: TracedRing[][]): TracedRing[] | undefined {
	if (parts.length === 1) return parts[0];
	for (let i = parts.length - 1; i >= 0; i--) {
		if (surrounds(parts[i][0], hole)) return parts[i];
	}
	return parts[0];
}

/** Decided by the first point of the hole that is not on the outer ring itself. */
function surrounds(outer: TracedRing, hole: TracedRing): boolean {
	if (outer.doubleArea < -hole.doubleArea) return false;
	for (let i = 0; i < hole.points.length; i += 2) {
		const { points } = outer;
		const side = sideOfRing(points, 0, points.length / 2, hole.points[i], hole.points[i + 1]);
		if (side !== 0) return side > 0;
	}
	return true;
}
