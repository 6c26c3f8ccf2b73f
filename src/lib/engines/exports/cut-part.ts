/**
 * A polygon across 180 degrees as polygons on either side (RFC 7946, 3.1.9). Its rings are parted into lines
 * that run on one side; along the meridian the ends are joined two and two, so that no edge is walked
 * both ways and a hole across the meridian becomes part of the edge (as polygons are clipped by Weiler and
 * Atherton 1977, with a line for the clipping polygon).
 */
import { cutRing, type LonLat } from '../sheet/index.ts';

export type Rings = LonLat[][];

/** Where a ring crosses the meridian: `east` if it goes there. */
interface Crossing {
	lat: number;
	east: boolean;
}

/** A stretch of a ring on one side, with the crossings at both ends. */
interface Stretch {
	points: LonLat[];
	from: Crossing;
	to: Crossing;
}

/**
 * In: closed rings running on, the outer anticlockwise and holes clockwise, as `ringLonLat` gives them.
 * Out: polygons within -180 to 180. A ring round a pole is closed through it first; holes then stay holes.
 */
export function cutPart(part: Rings): Rings[] {
	if (part.some(goesRound)) return cutRingByRing(part);
	const rings = together(part);
	const [west, east] = span(rings[0]);
	let open: Rings[] = [rings];
	for (let lon = 360 * Math.floor((west - 180) / 360) + 180; lon < east; lon += 360) {
		if (lon <= west) continue;
		const cut = open.map((one) => cutAt(one, lon));
		if (cut.includes(null)) return cutRingByRing(part);
		open = cut.flatMap((one) => one!);
	}
	return open.map(settledTogether);
}

const goesRound = (ring: LonLat[]) => Math.abs(ring[ring.length - 1][0] - ring[0][0]) > 180;

export function span(ring: LonLat[]): [number, number] {
	let [west, east] = [Infinity, -Infinity];
	for (const [lon] of ring) [west, east] = [Math.min(west, lon), Math.max(east, lon)];
	return [west, east];
}

const middle = (ring: LonLat[]): number => (span(ring)[0] + span(ring)[1]) / 2;

const shifted = (ring: LonLat[], by: number): LonLat[] =>
	by ? ring.map(([lon, lat]) => [lon + by, lat]) : ring;

/** Holes brought to the turn of the globe that their outer ring is written on. */
const together = ([outer, ...holes]: Rings): Rings => [
	outer,
	...holes.map((hole) => shifted(hole, 360 * Math.round((middle(outer) - middle(hole)) / 360))),
];

function settledTogether(rings: Rings): Rings {
	const by = -360 * Math.round(middle(rings[0]) / 360);
	return rings.map((ring) => shifted(ring, by));
}

/** Both sides of a polygon; null where its rings cross each other, which no rule can put right. */
function cutAt(rings: Rings, lon: number): Rings[] | null {
	const whole: { ring: LonLat[]; east: boolean }[] = [];
	const stretches: { east: Stretch[]; west: Stretch[] } = { east: [], west: [] };
	for (const ring of rings) {
		const parted = stretchesOf(ring, lon);
		if (parted.length === 0) whole.push({ ring, east: ring[0][0] >= lon });
		for (const one of parted) stretches[one.from.east ? 'east' : 'west'].push(one);
	}
	const pairs = pairsOf([...stretches.east, ...stretches.west].map(({ from }) => from));
	if (!pairs) return null;
	return [false, true].flatMap((east) => {
		const made = [
			...joined(stretches[east ? 'east' : 'west'], pairs),
			...whole.filter((one) => one.east === east).map(({ ring }) => ring),
		];
		const outers = made.filter((ring) => twiceArea(ring) > 0);
		const holes = made.filter((ring) => twiceArea(ring) < 0);
		return outers.map((outer) => [outer, ...holes.filter((hole) => encloses(outer, hole))]);
	});
}

/** A ring parted where it crosses a meridian; none where it lies on one side. A place on it counts as east. */
function stretchesOf(ring: LonLat[], lon: number): Stretch[] {
	const points = ring.slice(0, -1);
	const before = (i: number) => points[(i || points.length) - 1];
	const isEast = ([at]: LonLat) => at >= lon;
	const first = points.findIndex((here, i) => isEast(here) !== isEast(before(i)));
	if (first < 0) return [];
	const turned = [...points.slice(first), ...points.slice(0, first)];
	const crossing = (a: LonLat, b: LonLat): Crossing => ({
		lat: a[1] + ((b[1] - a[1]) * (lon - a[0])) / (b[0] - a[0]),
		east: isEast(b),
	});
	const stretches: Stretch[] = [];
	const start = crossing(before(first), turned[0]);
	let [from, run] = [start, [] as LonLat[]];
	turned.forEach((here, i) => {
		run.push(here);
		const after = turned[i + 1] ?? turned[0];
		if (isEast(after) === isEast(here)) return;
		const to = i + 1 < turned.length ? crossing(here, after) : start;
		stretches.push({ points: [[lon, from.lat], ...run, [lon, to.lat]], from, to });
		[from, run] = [to, []];
	});
	return stretches;
}

/**
 * Each crossing with the one at the other end of the land between them. With land on the left of every ring,
 * those to the east and to the west alternate from south to north.
 */
function pairsOf(crossings: Crossing[]): Map<Crossing, Crossing> | null {
	const sorted = crossings.toSorted((a, b) => a.lat - b.lat);
	const pairs = new Map<Crossing, Crossing>();
	while (sorted.length) {
		const [south, north] = [take(sorted, true), take(sorted, false)];
		if (!south || !north) return null;
		pairs.set(south, north).set(north, south);
	}
	return pairs;
}

/** Takes the southernmost crossing if it goes the way asked for, among those in one place. */
function take(sorted: Crossing[], east: boolean): Crossing | null {
	const at = sorted.findIndex((one) => one.east === east && one.lat === sorted[0].lat);
	return at < 0 ? null : sorted.splice(at, 1)[0];
}

/** Stretches of one side joined along the meridian to closed rings; those of no width are left out. */
function joined(stretches: Stretch[], pairs: Map<Crossing, Crossing>): LonLat[][] {
	const starting = new Map(stretches.map((one) => [one.from, one]));
	const rings: LonLat[][] = [];
	for (const first of stretches) {
		const points: LonLat[] = [];
		for (let one = starting.get(first.from); one; one = starting.get(pairs.get(one.to)!)) {
			starting.delete(one.from);
			points.push(...one.points);
		}
		if (points.length === 0) continue;
		const ring = [...points, points[0]].filter(
			([x, y], i, all) => i === 0 || x !== all[i - 1][0] || y !== all[i - 1][1],
		);
		if (twiceArea(ring) !== 0) rings.push(ring);
	}
	return rings;
}

function twiceArea(ring: LonLat[]): number {
	let sum = 0;
	const [ox, oy] = ring[0];
	for (let i = 1; i < ring.length; i++) {
		const [[x0, y0], [x1, y1]] = [ring[i - 1], ring[i]];
		sum += (x0 - ox) * (y1 - oy) - (x1 - ox) * (y0 - oy);
	}
	return sum;
}

/** Most places of a hole decide, for it may touch the ring. */
const encloses = (ring: LonLat[], hole: LonLat[]): boolean =>
	2 * hole.filter((place) => holds(ring, place)).length > hole.length;

function holds(ring: LonLat[], [x, y]: LonLat): boolean {
	let inside = false;
	ring.forEach(([x0, y0], i) => {
		const [x1, y1] = ring[(i || ring.length) - 1];
		if (y0 > y !== y1 > y && x < ((x1 - x0) * (y - y0)) / (y1 - y0) + x0) inside = !inside;
	});
	return inside;
}

/** Every piece of the outer ring with the pieces of holes that lie in it. */
function cutRingByRing([outer, ...holes]: Rings): Rings[] {
	const cutHoles = holes.flatMap(cutRing);
	return cutRing(outer).map((piece) => [
		piece,
		...cutHoles.filter((hole) => encloses(piece, hole)),
	]);
}
