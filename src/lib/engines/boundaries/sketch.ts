import type { Sketch } from './question.ts';
import type { RawLayer } from './raw-layer.ts';

const mostPoints = 6000;
/** of the points of a large file, so many are looked at */
const mostSampled = 300_000;
/** of the longer side of the map; what is smaller cannot be seen, and less is drawn where that is too much */
const leastShare = 1 / 2000;

/**
 * A rough drawing of the outlines as they lie, in their own coordinates: points nearer to the one before
 * than can be seen are passed over, rings too small to see are left out and counted. The box is exact
 * over all points. Null when there is no point. Time: one look at each point for the box, then a few
 * passes over at most some 300,000 of them.
 */
export function sketchOf(layer: RawLayer): Sketch | null {
	const box = boxOf(layer.points.items, layer.points.length);
	if (box === null) return null;
	const side = Math.max(box[2] - box[0], box[3] - box[1]);
	const step = Math.max(1, Math.floor(layer.points.length / 2 / mostSampled));
	const places = decimals(side);
	for (let least = side * leastShare; ; least *= 1.6) {
		const drawn = thinned(layer, least, step, places);
		if (drawn?.lines.length) return { box, ...drawn };
		if (drawn) return { box, ...someRings(layer, places) };
	}
}

/** Least x, least y, greatest x, greatest y of interleaved positions; null when there is none. */
export function boxOf(
	points: Float64Array,
	length: number,
): [number, number, number, number] | null {
	let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
	for (let i = 0; i < length; i += 2) {
		const x = points[i];
		const y = points[i + 1];
		if (x < west) west = x;
		if (x > east) east = x;
		if (y < south) south = y;
		if (y > north) north = y;
	}
	return west <= east ? [west, south, east, north] : null;
}

/** Rings with points `least` apart, or null when together they are more than may be drawn. */
function thinned(
	layer: RawLayer,
	least: number,
	step: number,
	places: number,
): { lines: number[][]; leftOut: number } | null {
	const lines: number[][] = [];
	let leftOut = 0;
	let budget = mostPoints;
	for (let ring = 0; ring < layer.ringStarts.length; ring++) {
		const from = layer.ringStarts.items[ring];
		const to = layer.pointsBefore(ring + 1);
		const stride = Math.max(1, Math.min(step, (to - from) >> 3));
		const line = thinRing(layer.points.items, from, to, least, stride);
		if (line === null) {
			leftOut++;
			continue;
		}
		budget -= line.length / 2;
		if (budget < 0) return null;
		lines.push(line.map((value) => Number(value.toFixed(places))));
	}
	return { lines, leftOut };
}

/** Where no ring is large enough to see: every so many of them, by a few corners each. */
function someRings(layer: RawLayer, places: number): { lines: number[][]; leftOut: number } {
	const lines: number[][] = [];
	const rings = layer.ringStarts.length;
	for (let ring = 0; ring < rings; ring += Math.ceil(rings / 1000)) {
		const from = layer.ringStarts.items[ring];
		const to = layer.pointsBefore(ring + 1);
		const line = thinRing(layer.points.items, from, to, 0, Math.max(1, Math.ceil((to - from) / 5)));
		if (line) lines.push(line.map((value) => Number(value.toFixed(places))));
	}
	return { lines, leftOut: rings - lines.length };
}

/** A ring from its first to its last point; null when no point of it lies far enough from the first. */
function thinRing(points: Float64Array, from: number, to: number, least: number, step: number) {
	if (to - from < 3) return null;
	let [x, y] = [points[2 * from], points[2 * from + 1]];
	const line = [x, y];
	for (let i = from + step; i < to - 1; i += step) {
		const [nextX, nextY] = [points[2 * i], points[2 * i + 1]];
		if (Math.abs(nextX - x) < least && Math.abs(nextY - y) < least) continue;
		line.push((x = nextX), (y = nextY));
	}
	if (line.length < 6) return null;
	line.push(points[2 * to - 2], points[2 * to - 1]);
	return line;
}

/** Decimal places that resolve a ten-thousandth of a length. */
const decimals = (side: number): number =>
	Math.min(12, Math.max(0, Math.ceil(4 - Math.log10(side || 1))));
