import type { Coverage } from '../../boundaries/coverage.ts';

/** The part of the globe that regions take up, in degrees. `east` may exceed 180, never `west`+360. */
export interface Extent {
	west: number;
	east: number;
	south: number;
	north: number;
	/** a meridian on which the globe may be cut open with the least harm, -180 to 180 */
	cut: number;
	/** whether borders cross that meridian all the same */
	crossed: boolean;
}

/** The short way from one longitude to another, -180 to 180. */
export function lonStep(from: number, to: number): number {
	const step = to - from;
	return step - 360 * Math.round(step / 360);
}

/** Longitude brought into -180 (excluded) to 180. */
export function wrapLon(lon: number): number {
	const wrapped = lon - 360 * Math.ceil((lon - 180) / 360);
	return wrapped === 0 ? 0 : wrapped;
}

/** What of a coverage its extent is measured from. */
export type GroundShape = Pick<Coverage, 'arcPoints' | 'arcStarts' | 'ringArcs' | 'ringStarts'>;

interface Span {
	west: number;
	east: number;
}

/** From where to where each arc runs in longitude, west brought into -180 to 180. */
function arcSpans({ arcPoints, arcStarts }: GroundShape): Span[] {
	const spans: Span[] = [];
	for (let arc = 0; arc + 1 < arcStarts.length; arc++) {
		let lon = arcPoints[2 * arcStarts[arc]];
		let [west, east] = [lon, lon];
		for (let point = arcStarts[arc] + 1; point < arcStarts[arc + 1]; point++) {
			lon += lonStep(lon, arcPoints[2 * point]);
			if (lon < west) west = lon;
			if (lon > east) east = lon;
		}
		const shift = wrapLon(west) - west;
		spans.push({ west: west + shift, east: east + shift });
	}
	return spans.sort((a, b) => a.west - b.west || a.east - b.east);
}

/** The widest stretch of longitude no arc enters; width 0 where there is none. */
function widestGap(spans: Span[]): Span {
	let gap: Span = { west: 180, east: 180 };
	let reached = lastReach(spans);
	for (const span of spans) {
		if (span.west - reached > gap.east - gap.west) gap = { west: reached, east: span.west };
		reached = Math.max(reached, span.east);
	}
	return gap;
}

/** How far the last span reaches, seen from the first: past 180 it comes back on the other side. */
function lastReach(spans: Span[]): number {
	let reach = -Infinity;
	for (const span of spans) reach = Math.max(reach, span.east - 360);
	return reach;
}

/** South and north limit; a ring that runs round the globe takes its pole in. */
function latitudes({ arcPoints, arcStarts, ringArcs, ringStarts }: GroundShape): [number, number] {
	let [south, north] = [90, -90];
	for (let i = 1; i < arcPoints.length; i += 2) {
		south = Math.min(south, arcPoints[i]);
		north = Math.max(north, arcPoints[i]);
	}
	for (let ring = 0; ring + 1 < ringStarts.length; ring++) {
		let [turn, lat, points] = [0, 0, 0];
		for (let i = ringStarts[ring]; i < ringStarts[ring + 1]; i++) {
			const arc = ringArcs[i] < 0 ? ~ringArcs[i] : ringArcs[i];
			let steps = 0;
			for (let point = arcStarts[arc]; point < arcStarts[arc + 1]; point++) {
				if (point > arcStarts[arc])
					steps += lonStep(arcPoints[2 * point - 2], arcPoints[2 * point]);
				lat += arcPoints[2 * point + 1];
				points++;
			}
			turn += ringArcs[i] < 0 ? -steps : steps;
		}
		if (Math.abs(turn) > 350) {
			if (lat / points > 0) north = 90;
			else south = -90;
		}
	}
	return [south, north];
}

/** Beyond this the sheet is a map of the world, and is cut at 180 degrees if nothing lies across. */
const worldSpan = 300;

/**
 * Where the regions lie on the globe, whichever side of 180 degrees they are written on.
 *
 * In: a coverage with at least one arc. Out: the narrowest band of longitudes that holds every arc,
 * their latitudes, and where to cut the globe open: in the widest stretch nothing enters.
 */
export function extentOf(coverage: GroundShape): Extent {
	const spans = arcSpans(coverage);
	const gap = widestGap(spans);
	const [south, north] = latitudes(coverage);
	const span = 360 - (gap.east - gap.west);
	const across = spans.some(({ west, east }) => (west < 180 && east > 180) || west < -180);
	if (span >= worldSpan && !across) {
		return { west: -180, east: 180, south, north, cut: 180, crossed: false };
	}
	if (span >= 360) return { west: -180, east: 180, south, north, cut: 180, crossed: across };
	const west = wrapLon(gap.east);
	const cut = wrapLon((gap.west + gap.east) / 2);
	return { west, east: west + span, south, north, cut, crossed: false };
}
