import { eachRing } from './outlines-of.ts';
import { cutAtMeridian } from './cut-at-meridian.ts';
import type { RawLayer } from './raw-layer.ts';

/** Regions by feature number whose outlines crossed the 180th meridian and were joined or cut there. */
export interface Placed {
	/** no longitude lies west of this, nor 429 degrees east of it */
	west: number;
	crossing: Set<number>;
}

const slack = 1e-6;
const leastGap = 1e-3;

/**
 * Makes longitudes run on without a jump. Outlines that step over the 180th meridian are unrolled, and
 * the seam of the map is laid into the widest stretch of longitude that holds nothing, so that regions on
 * both sides of the meridian stand together. When the map goes right round the world the seam stays at
 * 180 degrees and outlines across it are cut there; one round a pole is led along the pole.
 */
export function placeLongitudes(layer: RawLayer): Placed {
	const points = layer.points.items;
	const [least, most] = extent(points, layer.points.length);
	const crossing = new Set<number>();
	if (most - least <= 180) {
		shift(points, 0, layer.points.length / 2, -360 * Math.round((least + most) / 720));
		return { west: -361, crossing };
	}
	const around = new Set<number>();
	for (const { feature, from, to } of eachRing(layer)) {
		const turn = unroll(points, from, to);
		if (turn === 0) continue;
		crossing.add(feature);
		if (turn !== 1) around.add(from);
	}
	const gap = around.size ? null : widestGap(layer);
	if (gap !== null) moveSeam(layer, gap);
	else cutAtMeridian(layer, around);
	return { west: extent(layer.points.items, layer.points.length)[0] - slack, crossing };
}

function extent(points: Float64Array, length: number): [number, number] {
	let least = Infinity;
	let most = -Infinity;
	for (let i = 0; i < length; i += 2) {
		if (points[i] < least) least = points[i];
		if (points[i] > most) most = points[i];
	}
	return [least, most];
}

/**
 * Unrolls a ring in place where it takes the long way round the world between two points.
 * 0: left as it was; 1: unrolled; 2: it goes round a pole and does not close.
 * A ring that would not become narrower is left alone, and so is an edge drawn along a whole parallel.
 */
function unroll(points: Float64Array, from: number, to: number): 0 | 1 | 2 {
	const unrolled = new Float64Array(to - from);
	let turns = 0;
	let steps = 0;
	let [least, most, before, after] = [Infinity, -Infinity, Infinity, -Infinity];
	for (let i = from; i < to; i++) {
		const lon = points[2 * i];
		const jump = i === from ? 0 : lon - points[2 * i - 2];
		if (Math.abs(jump) > 180 && Math.abs(jump) < 360 - slack) {
			turns -= Math.sign(jump);
			steps++;
		} else if (Math.abs(jump) >= 360 - slack && !isAtPole(points[2 * i + 1])) {
			turns -= Math.sign(jump);
			steps++;
		}
		const placed = lon + 360 * turns;
		unrolled[i - from] = placed;
		least = Math.min(least, placed);
		most = Math.max(most, placed);
		before = Math.min(before, lon);
		after = Math.max(after, lon);
	}
	if (steps === 0 || (turns === 0 && most - least > after - before - slack)) return 0;
	for (let i = from; i < to; i++) points[2 * i] = unrolled[i - from];
	return turns === 0 ? 1 : 2;
}

const isAtPole = (lat: number) => Math.abs(lat) > 90 - slack;

/** The middle of the widest stretch of longitude that no ring covers, or null when there is none. */
function widestGap(layer: RawLayer): number | null {
	const spans: [number, number][] = [];
	for (const { from, to } of eachRing(layer)) {
		const [least, most] = extent(layer.points.items.subarray(2 * from, 2 * to), 2 * (to - from));
		if (to === from) continue;
		const start = least - 360 * Math.floor((least + 180) / 360);
		spans.push([start, start + most - least]);
	}
	spans.sort((a, b) => a[0] - b[0]);
	let reach = Math.max(-Infinity, ...spans.map(([, end]) => end - 360));
	let best = leastGap;
	let middle: number | null = null;
	for (const [start, end] of spans) {
		if (start - reach > best) {
			best = start - reach;
			middle = (start + reach) / 2;
		}
		reach = Math.max(reach, end);
	}
	return middle;
}

/** Every ring east of the seam, the whole as near to longitude 0 as it goes. */
function moveSeam(layer: RawLayer, seam: number): void {
	const points = layer.points.items;
	for (const { from, to } of eachRing(layer)) {
		const [least] = extent(points.subarray(2 * from, 2 * to), 2 * (to - from));
		shift(points, from, to, 360 * Math.ceil((seam - least) / 360));
	}
	const [least, most] = extent(points, layer.points.length);
	shift(points, 0, layer.points.length / 2, -360 * Math.round((least + most) / 720));
}

function shift(points: Float64Array, from: number, to: number, by: number): void {
	if (by === 0) return;
	for (let i = from; i < to; i++) points[2 * i] += by;
}
