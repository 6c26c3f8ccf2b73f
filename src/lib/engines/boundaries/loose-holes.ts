import { boxOf, ringPoints } from '../geometry/coverage-rings.ts';
import { sideOfRing } from '../geometry/rings.ts';
import type { Coverage } from '../geometry/coverage.ts';

/**
 * Regions with a hole that lies outside the part it belongs to, and where: the outline crosses itself in
 * a corner, so that one of its loops is walked the wrong way round.
 */
export function looseHoles(coverage: Coverage): { region: number; at: [number, number] }[] {
	const { keys, regionParts, partRings } = coverage;
	const found: { region: number; at: [number, number] }[] = [];
	for (let region = 0; region < keys.length; region++) {
		const at = firstLoose(coverage, regionParts[region], regionParts[region + 1], partRings);
		if (at) found.push({ region, at });
	}
	return found;
}

function firstLoose(coverage: Coverage, from: number, to: number, partRings: Uint32Array) {
	for (let part = from; part < to; part++) {
		const outer = partRings[part];
		if (partRings[part + 1] === outer + 1) continue;
		const corners = cornersOf(coverage, outer);
		const points = ringPoints(coverage, outer);
		for (let ring = outer + 1; ring < partRings[part + 1]; ring++) {
			const hole = ringPoints(coverage, ring);
			const touch = [...cornersOf(coverage, ring)].find((corner) => corners.has(corner));
			if (touch === undefined && isBoxInside(hole, points)) continue;
			if (!isInside(points, hole)) return placeOf(touch) ?? placeOf(`${hole[0]} ${hole[1]}`);
		}
	}
	return null;
}

/** Places where the arcs of a ring begin: rings that touch do it there. */
function cornersOf({ ringArcs, ringStarts, arcStarts, arcPoints }: Coverage, ring: number) {
	const corners = new Set<string>();
	for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
		const half = ringArcs[i];
		const point = 2 * (half >= 0 ? arcStarts[half] : arcStarts[~half + 1] - 1);
		corners.add(`${arcPoints[point]} ${arcPoints[point + 1]}`);
	}
	return corners;
}

function placeOf(corner: string | undefined): [number, number] | null {
	if (corner === undefined) return null;
	const [x, y] = corner.split(' ').map(Number);
	return [x, y];
}

function isBoxInside(inner: Float64Array, outer: Float64Array): boolean {
	const [a, b] = [boxOf(inner), boxOf(outer)];
	return a[0] >= b[0] && a[1] >= b[1] && a[2] <= b[2] && a[3] <= b[3];
}

/** Decided by the first point that is not on the outer ring itself. */
function isInside(outer: Float64Array, hole: Float64Array): boolean {
	for (let i = 0; i < hole.length; i += 2) {
		const side = sideOfRing(outer, 0, outer.length / 2, hole[i], hole[i + 1]);
		if (side !== 0) return side > 0;
	}
	return true;
}
