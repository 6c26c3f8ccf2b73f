import type { Point } from './cells.ts';
import { collectionText, geometryOf } from './geojson.ts';
import { randomStream, shuffled } from './random.ts';
import { beyond, metre, quietSites, shift, tidy, type Copy, type Site } from './spoil.ts';
import type { District } from './survey.ts';

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
