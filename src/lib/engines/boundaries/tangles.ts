import { ringPoints } from '../geometry/coverage-rings.ts';
import { crossing } from '../geometry/crossing.ts';
import { doubleArea } from '../geometry/rings.ts';
import { SegmentBlocks } from '../geometry/segment-blocks.ts';
import type { Coverage } from './coverage.ts';

/** Pairs of arcs that cross, an arc that crosses itself twice over; only pairs with a `wanted` arc if given. */
export function crossedArcs(
	coverage: Coverage,
	wanted: Uint8Array | null,
): readonly (readonly [number, number])[] {
	const { arcPoints, arcLeft } = coverage;
	const found = new Map<number, readonly [number, number]>();
	const blocks = new SegmentBlocks(coverage);
	blocks.eachPair(
		(arc) => wanted === null || wanted[arc] > 0,
		(arc, point, other, otherPoint) => {
			if (!crossing(arcPoints, point, arcPoints, otherPoint)) return;
			const [a, b] = arc < other ? [arc, other] : [other, arc];
			found.set(a * arcLeft.length + b, [a, b]);
		},
	);
	return [...found.values()];
}

/** Arcs of rings that do not turn the way they must: outer rings anticlockwise, holes clockwise. */
export function turnedArcs(coverage: Coverage): Set<number> {
	const { partRings, ringArcs, ringStarts } = coverage;
	const turned = new Set<number>();
	for (let part = 0; part + 1 < partRings.length; part++) {
		for (let ring = partRings[part]; ring < partRings[part + 1]; ring++) {
			const points = ringPoints(coverage, ring);
			const area = doubleArea(points, 0, points.length / 2);
			if (ring === partRings[part] ? area > 0 : area < 0) continue;
			for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++)
				turned.add(ringArcs[i] >= 0 ? ringArcs[i] : ~ringArcs[i]);
		}
	}
	return turned;
}
