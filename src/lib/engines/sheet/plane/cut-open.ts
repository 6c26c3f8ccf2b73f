/**
 * Rings and lines that run across 180 degrees, cut there for a map that is open along that meridian.
 * Rings by clipping against one turn of the globe after another (Sutherland and Hodgman 1974); a ring
 * that goes round a pole is first closed through the pole.
 */
import type { LonLat } from './ring-lonlat.ts';

/** The crossing of a segment with a meridian, straight in longitude and latitude. */
function crossing([x0, y0]: LonLat, [x1, y1]: LonLat, lon: number): LonLat {
	return [lon, y0 + ((y1 - y0) * (lon - x0)) / (x1 - x0)];
}

/** The part of a closed ring on one side of a meridian: `side` 1 keeps the east, -1 the west. */
function keepSide(ring: LonLat[], lon: number, side: 1 | -1): LonLat[] {
	const kept: LonLat[] = [];
	ring.forEach((here, i) => {
		const before = ring[(i || ring.length) - 1];
		const [isIn, wasIn] = [(here[0] - lon) * side >= 0, (before[0] - lon) * side >= 0];
		if (isIn !== wasIn) kept.push(crossing(before, here, lon));
		if (isIn) kept.push(here);
	});
	return kept;
}

function turns(points: LonLat[]): number[] {
	const lons = points.map(([lon]) => lon);
	const first = Math.ceil((Math.min(...minMax(lons)) - 180) / 360);
	const last = Math.floor((Math.max(...minMax(lons)) + 180) / 360);
	return Array.from({ length: last - first + 1 }, (_, i) => first + i);
}

function minMax(values: number[]): [number, number] {
	return [
		values.reduce((a, b) => Math.min(a, b), Infinity),
		values.reduce((a, b) => Math.max(a, b), -Infinity),
	];
}

/** In: a ring running on, as `ringLonLat` gives it. Out: closed rings within -180 to 180. */
export function cutRing(points: LonLat[]): LonLat[][] {
	const [first, last] = [points[0], points[points.length - 1]];
	const ring = points.slice(0, -1);
	if (Math.abs(last[0] - first[0]) > 180) {
		const mean = points.reduce((sum, [, lat]) => sum + lat, 0) / points.length;
		const pole = mean > 0 ? 90 : -90;
		ring.push(last, [last[0], pole], [first[0], pole]);
	}
	return turns(ring)
		.map((turn) => {
			const east = keepSide(ring, 360 * turn - 180, 1);
			const both = east.length ? keepSide(east, 360 * turn + 180, -1) : [];
			return both.map(([lon, lat]): LonLat => [lon - 360 * turn, lat]);
		})
		.filter((piece) => piece.length >= 3 && new Set(piece.map(([lon]) => lon)).size > 1)
		.map((piece) => [...piece, piece[0]]);
}

/** In: a line running on. Out: its pieces within -180 to 180, in order. */
export function cutLine(points: LonLat[]): LonLat[][] {
	const pieces: LonLat[][] = [];
	for (const turn of turns(points)) {
		const [west, east] = [360 * turn - 180, 360 * turn + 180];
		const within = (lon: number) => lon >= west && lon <= east;
		let piece: LonLat[] = [];
		const end = () => {
			if (piece.length > 1) pieces.push(piece.map(([lon, lat]) => [lon - 360 * turn, lat]));
			piece = [];
		};
		points.forEach((here, i) => {
			const before = points[i - 1];
			const meets = before ? [west, east].filter((lon) => between(lon, before[0], here[0])) : [];
			if (before && before[0] > here[0]) meets.reverse();
			for (const lon of meets) {
				piece.push(crossing(before, here, lon));
				if (piece.length > 1) end();
			}
			if (within(here[0])) piece.push(here);
			else end();
		});
		end();
	}
	return pieces;
}

function between(lon: number, a: number, b: number): boolean {
	return (a < lon && lon < b) || (b < lon && lon < a);
}
