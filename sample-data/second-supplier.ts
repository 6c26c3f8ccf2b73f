import type { Point } from './cells.ts';
import { collectionText, geometryOf } from './geojson.ts';
import { randomStream, shuffled } from './random.ts';
import type { District } from './survey.ts';

/** One district as the second supplier has it. */
interface Copy {
	code: string;
	label: string;
	polygons: Point[][][];
}

/** A place on the border of two districts: the position `at` of the outer ring of one of them. */
interface Site {
	ring: Point[];
	at: number;
	owner: Copy;
}

/** About a metre of latitude, in degrees. */
const metre = 1 / 111_200;

/**
 * The same republic from a careless hand: see README.md for what is wrong and how often. Districts come
 * in another order, rings begin elsewhere, columns are named otherwise.
 */
export function secondSupplier(districts: readonly District[], seed: number): string {
	const random = randomStream(seed + 1);
	const copies = districts.map(({ code, name, polygons }): Copy => ({
		code,
		label: name,
		polygons: structuredClone(polygons),
	}));
	const sites = quietSites(copies);
	const take = (count: number) => {
		if (sites.length < count) throw new Error('Not enough borders to spoil');
		return sites.splice(0, count);
	};
	for (const site of take(4)) shift(site, -25 * metre);
	for (const site of take(3)) shift(site, 40 * metre);
	for (const site of take(1)) shift(site, -700 * metre);
	for (const site of take(12)) splitSide(site);
	for (const site of take(1)) spike(site);
	for (const site of take(1)) site.ring.splice(site.at, 0, [...site.ring[site.at]]);
	for (const site of take(1)) stray(site);
	const [reversed, unclosed, twice] = take(3);
	for (const { owner } of take(30)) shake(owner, random);
	for (const copy of copies) for (const ring of copy.polygons.flat()) turn(ring, random);
	reversed.owner.polygons[0][0].reverse();
	unclosed.owner.polygons[0][0].pop();
	copies.push({ ...twice.owner, code: `${twice.owner.code}B` });
	const features = shuffled(copies, random).map(({ code, label, polygons }) =>
		JSON.stringify({
			type: 'Feature',
			properties: { DIST_ID: code, LABEL: label.toUpperCase() },
			geometry: geometryOf(polygons),
		}),
	);
	return collectionText(features, 'Tavaröe, second supplier');
}

/** One site for each of many districts, no two of them on the same district. */
function quietSites(copies: Copy[]): Site[] {
	const owners = new Map<string, Copy[]>();
	for (const copy of copies) {
		const own = new Set(copy.polygons.flat(2).map((point) => point.join()));
		for (const key of own) owners.set(key, [...(owners.get(key) ?? []), copy]);
	}
	const taken = new Set<Copy>();
	return copies.flatMap((owner) => {
		const ring = owner.polygons[0][0];
		const pair = (at: number) => owners.get(ring[at].join()) ?? [];
		const at = ring.findIndex((_, i) => {
			const both = pair(i);
			const run = [i - 2, i - 1, i + 1, i + 2];
			return (
				i > 2 &&
				i < ring.length - 3 &&
				both.length === 2 &&
				!both.some((copy) => taken.has(copy)) &&
				run.every((near) => pair(near).length === 2 && pair(near).every((c) => both.includes(c)))
			);
		});
		if (at < 0) return [];
		pair(at).forEach((copy) => taken.add(copy));
		return [{ ring, at, owner }];
	});
}

/** Moves one corner on one side of the border only: outwards it overlaps, inwards it leaves a gap. */
function shift(site: Site, degrees: number): void {
	site.ring[site.at] = beyond(site, degrees);
}

/** The position straight across the border from a site, positive into the other district. */
function beyond({ ring, at }: Site, degrees: number): Point {
	const [before, here, after] = [ring[at - 1], ring[at], ring[at + 1]];
	const narrow = Math.cos((here[1] * Math.PI) / 180);
	const [dx, dy] = [(after[0] - before[0]) * narrow, after[1] - before[1]];
	const length = Math.hypot(dx, dy);
	return [
		tidy(here[0] + ((dy / length) * degrees) / narrow),
		tidy(here[1] - (dx / length) * degrees),
	];
}

/** A corner more on one side of the border only, in the middle of a straight piece. */
function splitSide({ ring, at }: Site): void {
	const [from, to] = [ring[at], ring[at + 1]];
	ring.splice(at + 1, 0, [tidy((from[0] + to[0]) / 2), tidy((from[1] + to[1]) / 2)]);
}

/** A needle into the district's own land and back on itself. */
function spike({ ring, at }: Site): void {
	const here = ring[at];
	const [dx, dy] = [here[0] - ring[at - 1][0], here[1] - ring[at - 1][1]];
	const tip: Point = [tidy(here[0] - dy * 0.4), tidy(here[1] + dx * 0.4)];
	ring.splice(at, 0, [...here], tip);
}

/** A crumb of a few square metres as a part of its own, on the far side of the border. */
function stray(site: Site): void {
	const [x, y] = beyond(site, 400 * metre);
	const size = 3 * metre;
	const corners: Point[] = [
		[x, y],
		[x + size, y],
		[x, y + size],
		[x, y],
	];
	site.owner.polygons.push([corners.map(([lon, lat]): Point => [tidy(lon), tidy(lat)])]);
}

/** Noise of up to a millimetre on every position of a district. */
function shake(copy: Copy, random: () => number): void {
	for (const ring of copy.polygons.flat()) {
		for (const position of ring.slice(0, -1)) {
			position[0] = tidy(position[0] + (2 * random() - 1) * metre * 0.001);
			position[1] = tidy(position[1] + (2 * random() - 1) * metre * 0.001);
		}
		ring[ring.length - 1] = [...ring[0]];
	}
}

/** The same ring begun at another corner. */
function turn(ring: Point[], random: () => number): void {
	const open = ring.slice(0, -1);
	const first = Math.floor(random() * open.length);
	const turned = [...open.slice(first), ...open.slice(0, first)];
	ring.splice(0, ring.length, ...turned, turned[0]);
}

function tidy(degrees: number): number {
	return Math.round(degrees * 1e10) / 1e10;
}
