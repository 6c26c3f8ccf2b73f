import Flatbush from 'flatbush';
import type { Coverage } from '../geometry/coverage.ts';
import { boxOf, ringPoints } from '../geometry/coverage-rings.ts';
import { doubleArea, sideOfRing } from '../geometry/rings.ts';

type Cut = Omit<Coverage, 'areasKm2' | 'enclaveOf'>;

/**
 * For each region the one region whose holes contain all its parts, or -1. A part counts as inside a
 * hole when it fills it, shares it with others or lies free in it; of nested holes the smallest decides.
 */
export function enclaves(cut: Cut): Int32Array {
	const regions = cut.keys.length;
	const holes = holesOf(cut);
	if (holes.length === 0) return new Int32Array(regions).fill(-1);
	const around = surroundings(cut, holes);
	const enclaveOf = new Int32Array(regions);
	for (let r = 0; r < regions; r++) {
		const first = cut.regionParts[r];
		const end = cut.regionParts[r + 1];
		let one = first < end ? around[first] : -1;
		for (let p = first; p < end; p++) if (around[p] !== one) one = -1;
		enclaveOf[r] = one;
	}
	return enclaveOf;
}

/** For each part the region of the smallest hole it lies in, or -1; a region's own holes do not count. */
export function surroundedBy(cut: Cut): Int32Array {
	return surroundings(cut, holesOf(cut));
}

interface Hole {
	region: number;
	points: Float64Array;
	size: number;
}

/** Largest first, so that a smaller hole overrules the ones around it. */
function holesOf(cut: Cut): Hole[] {
	const holes: Hole[] = [];
	for (let region = 0; region < cut.keys.length; region++) {
		for (let part = cut.regionParts[region]; part < cut.regionParts[region + 1]; part++) {
			for (let ring = cut.partRings[part] + 1; ring < cut.partRings[part + 1]; ring++) {
				const points = ringPoints(cut, ring);
				holes.push({ region, points, size: -doubleArea(points, 0, points.length / 2) });
			}
		}
	}
	return holes.sort((a, b) => b.size - a.size);
}

/** For each part the region of the smallest hole it lies in, or -1. */
function surroundings(cut: Cut, holes: Hole[]): Int32Array {
	const parts = cut.partRings.length - 1;
	const around = new Int32Array(parts).fill(-1);
	const index = new Flatbush(parts);
	const boxes = arcBoxes(cut);
	for (let part = 0; part < parts; part++) {
		index.add(...ringBox(cut, cut.partRings[part], boxes));
	}
	index.finish();
	const owner = ownersOfParts(cut);
	for (const hole of holes) {
		const box = boxOf(hole.points);
		const inside = index.search(...box, (_part, x0, y0, x1, y1) => {
			return x0 >= box[0] && y0 >= box[1] && x1 <= box[2] && y1 <= box[3];
		});
		for (const part of inside) {
			if (owner[part] !== hole.region && isInside(hole, ringPoints(cut, cut.partRings[part]))) {
				around[part] = hole.region;
			}
		}
	}
	return around;
}

/** West, south, east, north of every arc. */
function arcBoxes(cut: Cut): Float64Array {
	const boxes = new Float64Array(4 * cut.arcLeft.length);
	for (let arc = 0; arc < cut.arcLeft.length; arc++) {
		const points = cut.arcPoints.subarray(2 * cut.arcStarts[arc], 2 * cut.arcStarts[arc + 1]);
		boxes.set(boxOf(points), 4 * arc);
	}
	return boxes;
}

function ringBox(cut: Cut, ring: number, boxes: Float64Array): [number, number, number, number] {
	let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
	for (let i = cut.ringStarts[ring]; i < cut.ringStarts[ring + 1]; i++) {
		const at = 4 * (cut.ringArcs[i] >= 0 ? cut.ringArcs[i] : ~cut.ringArcs[i]);
		west = Math.min(west, boxes[at]);
		south = Math.min(south, boxes[at + 1]);
		east = Math.max(east, boxes[at + 2]);
		north = Math.max(north, boxes[at + 3]);
	}
	return [west, south, east, north];
}

function ownersOfParts(cut: Cut): Int32Array {
	const owner = new Int32Array(cut.partRings.length - 1);
	for (let r = 0; r < cut.keys.length; r++) {
		owner.fill(r, cut.regionParts[r], cut.regionParts[r + 1]);
	}
	return owner;
}

function isInside(hole: Hole, points: Float64Array): boolean {
	for (let i = 0; i < points.length; i += 2) {
		const side = sideOfRing(hole.points, 0, hole.points.length / 2, points[i], points[i + 1]);
		if (side !== 0) return side > 0;
	}
	return true;
}
