import { GrowingFloats, GrowingInts } from '../geometry/growing.ts';
import { doubleArea } from '../geometry/rings.ts';
import { eachRing } from './outlines-of.ts';
import type { RawLayer } from './raw-layer.ts';

const slack = 1e-9;

/**
 * Cuts the rings of a map that goes right round the world at the 180th meridian, in place. `around`
 * holds the first points of rings that go round a pole; they are led along it. The pieces of an outer
 * ring become parts of their own, so that each keeps to its side.
 */
export function cutAtMeridian(layer: RawLayer, around: Set<number>): void {
	const rings = [...eachRing(layer)].map((ring) => {
		const points = layer.points.items.slice(2 * ring.from, 2 * ring.to);
		const closed = around.has(ring.from) ? alongPole(points) : points;
		const size = around.has(ring.from) ? Math.abs(doubleArea(closed, 0, closed.length / 2)) : 0;
		return { ...ring, size, pieces: piecesOf(closed) };
	});
	putLargestFirst(rings);
	const regions = layer.regions;
	layer.points = new GrowingFloats(layer.points.length + 1024);
	layer.ringStarts = new GrowingInts();
	layer.partRings = new GrowingInts();
	layer.regionParts = new GrowingInts();
	let next = 0;
	for (let feature = 0; feature < regions; feature++) {
		layer.startRegion();
		for (; next < rings.length && rings[next].feature === feature; next++) {
			for (const piece of rings[next].pieces) {
				if (!rings[next].isHole) layer.startPart();
				layer.startRing();
				for (let i = 0; i < piece.length; i += 2) layer.point(piece[i], piece[i + 1]);
			}
		}
	}
}

/**
 * Of two rings round the same pole the one farther from it is the outer one, whichever the file names
 * first: a small circle round the pole stands for the hole that it is on the flat map.
 */
function putLargestFirst(rings: { isHole: boolean; size: number }[]): void {
	let outer = 0;
	for (let i = 1; i < rings.length; i++) {
		if (!rings[i].isHole) outer = i;
		else if (rings[outer].size > 0 && rings[i].size > rings[outer].size) {
			[rings[outer], rings[i]] = [rings[i], rings[outer]];
			[rings[outer].isHole, rings[i].isHole] = [false, true];
		}
	}
}

/** From the last point to the pole, back along it, and to the first point: now the ring closes. */
function alongPole(points: Float64Array): Float64Array {
	const last = points.length - 2;
	let sum = 0;
	for (let i = 1; i < points.length; i += 2) sum += points[i];
	const pole = sum < 0 ? -90 : 90;
	return Float64Array.of(...points, points[last], pole, points[0], pole, points[0], points[1]);
}

function piecesOf(points: Float64Array): Float64Array[] {
	let least = Infinity;
	let most = -Infinity;
	for (let i = 0; i < points.length; i += 2) {
		least = Math.min(least, points[i]);
		most = Math.max(most, points[i]);
	}
	if (least >= -180 - slack && most <= 180 + slack) return [points];
	const by = -360 * Math.floor((least + 180 + slack) / 360);
	const moved = points.map((value, i) => (i % 2 ? value : value + by));
	if (most + by <= 180 + slack) return [moved];
	const east = clip(moved, 1).map((value, i) => (i % 2 ? value : value - 360));
	return [clip(moved, -1), east].filter((piece) => piece.length >= 6);
}

/** The part of a ring west (-1) or east (1) of longitude 180 (Sutherland and Hodgman 1974, one edge). */
function clip(points: Float64Array, side: -1 | 1): Float64Array {
	const kept: number[] = [];
	const inside = (x: number) => side * (x - 180) >= 0;
	for (let i = 0; i < points.length; i += 2) {
		const j = i === 0 ? points.length - 2 : i - 2;
		const [x1, y1, x2, y2] = [points[j], points[j + 1], points[i], points[i + 1]];
		if (inside(x1) !== inside(x2)) kept.push(180, y1 + ((180 - x1) / (x2 - x1)) * (y2 - y1));
		if (inside(x2)) kept.push(x2, y2);
	}
	return Float64Array.from(kept);
}
