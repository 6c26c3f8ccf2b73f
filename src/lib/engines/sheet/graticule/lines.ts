/**
 * Meridians and parallels at even steps, on the paper, cut at the map's box and at the insets. In: the map
 * as placed. Out: each line with the pieces of it that show. Right on every projection: lines are broken
 * where the map is open, and end one step short of a pole that is a place, where they would run together.
 */
import { wrapLon } from '../plane/extent.ts';
import type { OnPaper } from '../place-on-paper.ts';
import { insideOf, outsideOf, type Line } from './clip-lines.ts';
import { onPaper, seenDegrees, type SeenDegrees } from './seen-degrees.ts';
import type { GraticuleSteps } from './step.ts';

export interface GraticuleLine {
	kind: 'meridian' | 'parallel';
	/** degrees, -180 to 180 */
	value: number;
	pieces: Line[];
}

export interface Graticule {
	lines: GraticuleLine[];
	seen: SeenDegrees;
	/** kinds of which there would be too many, so that none is drawn */
	crowded: GraticuleLine['kind'][];
}

/** Degrees kept clear of the meridian where the map is open. */
const clear = 1e-6;
/** Radii of the sphere between neighbouring places of a line: beyond, the map is open between them. */
const leap = 0.5;
/** Most lines of one kind: more would be a grey tint. */
export const mostLines = 120;

export function graticuleLines(placed: OnPaper, steps: GraticuleSteps): Graticule {
	const { chosen, fit, box, extent, insets, globe } = placed;
	const middle =
		chosen.cut === null ? wrapLon((extent.west + extent.east) / 2) : wrapLon(chosen.cut + 180);
	const seen: SeenDegrees = globe
		? { west: -180, east: 180, south: -90, north: 90, middle, pole: null }
		: seenDegrees(chosen.projection, fit, box, middle);
	const [west, east] = [
		Math.max(seen.west - steps.lon, clear - 180),
		Math.min(seen.east + steps.lon, 180 - clear),
	];
	const [south, north] = [
		Math.max(-90, seen.south - steps.lat),
		Math.min(90, seen.north + steps.lat),
	];
	const shown = (line: Line): Line[] =>
		insets.reduce(
			(pieces, { outer }) => pieces.flatMap((piece) => outsideOf(piece, outer)),
			broken(line, fit.scale).flatMap((piece) => insideOf(piece, box)),
		);
	const walk = (places: [number, number][]) =>
		shown(places.map((place) => onPaper(chosen.projection, fit, place)));
	const meridians = multiples(middle + west, middle + east, steps.lon).map((lon): GraticuleLine => {
		const short = (pole: 'north' | 'south') =>
			seen.pole === pole && Math.abs(lon % 90) > 1e-9 ? steps.lat : 0;
		const ends = [Math.max(south, -90 + short('south')), Math.min(north, 90 - short('north'))];
		const places = spread(ends[0], ends[1]).map((lat): [number, number] => [lon, lat]);
		return { kind: 'meridian', value: wrapLon(lon), pieces: walk(places) };
	});
	const parallels = multiples(south, north, steps.lat)
		.filter((lat) => Math.abs(lat) < 90)
		.map((lat): GraticuleLine => {
			const places = spread(west, east).map((lon): [number, number] => [middle + lon, lat]);
			return { kind: 'parallel', value: lat, pieces: walk(places) };
		});
	const crowded = [
		...(tooMany(middle + west, middle + east, steps.lon) ? ['meridian' as const] : []),
		...(tooMany(south, north, steps.lat) ? ['parallel' as const] : []),
	];
	const lines = [...meridians, ...parallels].filter(({ pieces }) => pieces.length);
	return { lines, seen, crowded };
}

/** Number of the first multiple of a step within limits, and how many there are. */
function counted(from: number, to: number, step: number): { first: number; count: number } {
	const first = Math.ceil(from / step - 1e-9);
	return { first, count: Math.floor(to / step + 1e-9) - first + 1 };
}

const tooMany = (from: number, to: number, step: number): boolean =>
	counted(from, to, step).count > mostLines;

/** Multiples of a step within limits; none where they would be too many. */
function multiples(from: number, to: number, step: number): number[] {
	const { first, count } = counted(from, to, step);
	if (!(count > 0) || count > mostLines) return [];
	const all = Array.from({ length: count }, (_, i) => Number(((first + i) * step).toFixed(9)));
	// both ends of a whole turn are one meridian
	return to - from > 359.9 && all[count - 1] - all[0] >= 360 ? all.slice(0, -1) : all;
}

/** Places along a line, a degree apart or sixty in all. */
function spread(from: number, to: number): number[] {
	const count = Math.max(60, Math.ceil(to - from));
	return Array.from({ length: count + 1 }, (_, i) => from + ((to - from) * i) / count);
}

function broken(line: Line, scale: number): Line[] {
	const pieces: Line[] = [];
	let piece: Line = [];
	line.forEach((here, i) => {
		const before = line[i - 1];
		const far = before && Math.hypot(here[0] - before[0], here[1] - before[1]) > leap * scale;
		if (far || !here.every(Number.isFinite)) {
			if (piece.length > 1) pieces.push(piece);
			piece = [];
		}
		if (here.every(Number.isFinite)) piece.push(here);
	});
	if (piece.length > 1) pieces.push(piece);
	return pieces;
}
