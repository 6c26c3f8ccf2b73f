import type { BorderList } from '$lib/engines/borders/border-list';
import type { Coverage } from '$lib/engines/boundaries/coverage';
import type { Drawing } from '$lib/engines/sheet/drawing';

/** Where things stand on a drawn sheet; positions are hundredths of a millimetre, x and y interleaved. */

/** A place in each region's largest part: its middle, or where it is widest when the middle lies outside. */
export function anchorsOf(drawing: Drawing): Float64Array {
	const anchors = new Float64Array(2 * drawing.fills.length);
	for (const { region, rings } of drawing.fills) {
		let largest = 0;
		for (const ring of rings) {
			const { area, x, y } = centre(pointsOf(drawing, ring));
			if (Math.abs(area) <= largest) continue;
			largest = Math.abs(area);
			anchors[2 * region] = x;
			anchors[2 * region + 1] = y;
		}
	}
	return anchors;
}

function pointsOf({ arcPoints, arcStarts }: Drawing, ring: Int32Array): number[] {
	const points: number[] = [];
	for (const signed of ring) {
		const arc = signed < 0 ? ~signed : signed;
		const from = arcStarts[arc];
		const count = arcStarts[arc + 1] - from;
		for (let step = 0; step < count; step++) {
			const point = signed < 0 ? from + count - 1 - step : from + step;
			points.push(arcPoints[2 * point], arcPoints[2 * point + 1]);
		}
	}
	return points;
}

/** Area and centroid of a closed ring (the shoelace formula), or the first point of an empty one. */
function centre(points: readonly number[]): { area: number; x: number; y: number } {
	let [area, x, y] = [0, 0, 0];
	for (let i = 0, j = points.length - 2; i < points.length; j = i, i += 2) {
		const cross = points[j] * points[i + 1] - points[i] * points[j + 1];
		area += cross / 2;
		x += (points[j] + points[i]) * cross;
		y += (points[j + 1] + points[i + 1]) * cross;
	}
	if (area === 0) return { area, x: points[0] ?? 0, y: points[1] ?? 0 };
	return { area, x: x / (6 * area), y: y / (6 * area) };
}

/** For every border the arcs along it: `arcs[starts[i]] .. arcs[starts[i + 1] - 1]`. */
export interface BorderArcs {
	starts: Uint32Array;
	arcs: Uint32Array;
}

export function sharedArcs(coverage: Coverage, borders: BorderList): BorderArcs {
	const number = new Map<number, number>();
	const id = (a: number, b: number) => Math.min(a, b) * coverage.keys.length + Math.max(a, b);
	for (let border = 0; border < borders.a.length; border++)
		number.set(id(borders.a[border], borders.b[border]), border);
	const of: number[][] = Array.from(borders.a, () => []);
	for (let arc = 0; arc < coverage.arcLeft.length; arc++) {
		const [left, right] = [coverage.arcLeft[arc], coverage.arcRight[arc]];
		if (left < 0 || right < 0) continue;
		of[number.get(id(left, right)) ?? -1]?.push(arc);
	}
	const starts = new Uint32Array(of.length + 1);
	of.forEach((arcs, border) => (starts[border + 1] = starts[border] + arcs.length));
	return { starts, arcs: Uint32Array.from(of.flat()) };
}

/** Path data of some arcs of a drawing, each a line of its own. */
export function arcsPath(
	{ arcPoints, arcStarts }: Pick<Drawing, 'arcPoints' | 'arcStarts'>,
	arcs: Iterable<number>,
): string {
	let path = '';
	for (const arc of arcs) {
		for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++)
			path += `${point === arcStarts[arc] ? 'M' : 'L'}${arcPoints[2 * point]} ${arcPoints[2 * point + 1]}`;
	}
	return path;
}

/**
 * Where places on the ground (longitude and latitude, interleaved) fall on the sheet: carried over from
 * the nearest arc, at the same share of its points, so that no projection has to be known here.
 */
export function placesOn(drawing: Drawing, coverage: Coverage, places: Float64Array): Float64Array {
	const found = new Float64Array(places.length);
	for (let at = 0; at < places.length; at += 2) {
		const { arc, share } = nearestOnArcs(coverage, places[at], places[at + 1]);
		const from = drawing.arcStarts[arc];
		const last = drawing.arcStarts[arc + 1] - 1;
		const point = Math.round(from + share * (last - from));
		found[at] = drawing.arcPoints[2 * point];
		found[at + 1] = drawing.arcPoints[2 * point + 1];
	}
	return found;
}

function nearestOnArcs({ arcPoints, arcStarts }: Coverage, lon: number, lat: number) {
	let best = { arc: 0, share: 0 };
	let least = Infinity;
	const narrow = Math.cos((lat * Math.PI) / 180);
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		const span = Math.max(1, arcStarts[arc + 1] - 1 - arcStarts[arc]);
		for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) {
			const east = (arcPoints[2 * point] - lon) * narrow;
			const distance = east * east + (arcPoints[2 * point + 1] - lat) ** 2;
			if (distance >= least) continue;
			least = distance;
			best = { arc, share: (point - arcStarts[arc]) / span };
		}
	}
	return best;
}
