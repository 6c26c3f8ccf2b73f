import type { Coverage } from '../geometry/coverage.ts';
import { boxOf, ringPoints } from '../geometry/coverage-rings.ts';
import { sideOfRing } from '../geometry/rings.ts';

/** West, south, east, north in degrees. */
export type Box = [west: number, south: number, east: number, north: number];

/** The boxes of all regions, four numbers each; an empty region has none that meets another. */
export function regionBoxes(coverage: Coverage): Float64Array {
	const { regionParts, partRings } = coverage;
	const boxes = new Float64Array(4 * coverage.keys.length);
	for (let r = 0; r < coverage.keys.length; r++) {
		const box: Box = [Infinity, Infinity, -Infinity, -Infinity];
		// the outer ring of a part holds all of it
		for (let part = regionParts[r]; part < regionParts[r + 1]; part++) {
			widen(box, boxOf(ringPoints(coverage, partRings[part])));
		}
		boxes.set(box, 4 * r);
	}
	return boxes;
}

export const boxAt = (boxes: Float64Array, region: number): Box =>
	Array.from(boxes.subarray(4 * region, 4 * region + 4)) as Box;

export function widen(box: Box, [west, south, east, north]: Box): void {
	box[0] = Math.min(box[0], west);
	box[1] = Math.min(box[1], south);
	box[2] = Math.max(box[2], east);
	box[3] = Math.max(box[3], north);
}

/** The shortest length of a degree of latitude, in metres (WGS 84, at the equator), rounded down. */
const metresOfDegree = 110_000;

/** A box so many metres wider on every side. */
export function grown([west, south, east, north]: Box, metres: number): Box {
	const up = metres / metresOfDegree;
	const far = Math.min(89.9, Math.max(Math.abs(south), Math.abs(north)) + up);
	const across = up / Math.cos((far * Math.PI) / 180);
	return [west - across, south - up, east + across, north + up];
}

/** Whether two boxes meet, across the 180th meridian too. */
export const boxesMeet = (one: Box, other: Box): boolean =>
	one[1] <= other[3] &&
	other[1] <= one[3] &&
	[0, 360, -360].some((turn) => one[0] <= other[2] + turn && other[0] + turn <= one[2]);

/** How much of two boxes together is in both, 0 to 1. */
export function boxesShare(one: Box, other: Box): number {
	const width = Math.min(one[2], other[2]) - Math.max(one[0], other[0]);
	const height = Math.min(one[3], other[3]) - Math.max(one[1], other[1]);
	if (width <= 0 || height <= 0) return 0;
	const size = (box: Box) => (box[2] - box[0]) * (box[3] - box[1]);
	const both = width * height;
	return both / (size(one) + size(other) - both);
}

/** Regions with a line that has nobody on its other side. */
export function outerRegions({ arcLeft, arcRight, keys }: Coverage): Uint8Array {
	const outer = new Uint8Array(keys.length);
	for (let arc = 0; arc < arcLeft.length; arc++) {
		if (arcLeft[arc] < 0 && arcRight[arc] >= 0) outer[arcRight[arc]] = 1;
		if (arcRight[arc] < 0 && arcLeft[arc] >= 0) outer[arcLeft[arc]] = 1;
	}
	return outer;
}

export function ringsOfRegion(coverage: Coverage, region: number): Float64Array[] {
	const { regionParts, partRings } = coverage;
	const rings: Float64Array[] = [];
	const end = partRings[regionParts[region + 1]];
	for (let ring = partRings[regionParts[region]]; ring < end; ring++) {
		rings.push(ringPoints(coverage, ring));
	}
	return rings;
}

/** Whether a place lies inside rings by the even-odd rule. */
export const isInside = ([x, y]: [number, number], rings: readonly Float64Array[]): boolean =>
	rings.filter((ring) => sideOfRing(ring, 0, ring.length / 2, x, y) > 0).length % 2 === 1;
