import proj4 from 'proj4';
import type { Point } from './cells.ts';
import { shapefileZip } from './shapefile.ts';
import { beyond, metre, quietSites, shift, tidy, type Site } from './spoil.ts';
import type { District } from './survey.ts';

/** Zone 25 north of the Universal Transverse Mercator grid on WGS 84 (EPSG:32625), in metres. */
const onZone = proj4(
	'WGS84',
	'+proj=tmerc +lat_0=0 +lon_0=-33 +k=0.9996 +x_0=500000 +datum=WGS84 +units=m',
);

const toZone = (position: Point): Point => {
	const [x, y] = onZone.forward(position);
	return [Math.round(x * 1e5) / 1e5, Math.round(y * 1e5) / 1e5];
};

/**
 * The republic as an office sent it: a shapefile in metres whose reference system was lost on the way, with
 * the parts of three districts in rows of their own and faults on borders far apart; see README.md.
 */
export function carelessOffice(districts: readonly District[]): Uint8Array {
	const copies = structuredClone([...districts]);
	// sites point into the rings of the copies
	const sites = quietSites(copies.map((district) => ({ ...district, label: district.name })));
	const take = (count: number) => {
		if (sites.length < count) throw new Error('Not enough borders to spoil');
		return sites.splice(0, count);
	};
	for (const site of take(3)) shift(site, -25 * metre);
	for (const site of take(1)) shift(site, -600 * metre);
	for (const site of take(1)) shift(site, 60 * metre);
	for (const site of take(6)) shift(site, -5 * metre);
	for (const site of take(1)) part(site, copies);
	const [twice] = take(1);
	const original = copies.find(({ code }) => code === twice.owner.code);
	if (!original) throw new Error('A site without its district');
	tieBow(copies, districts);
	const rows = copies.flatMap((district) =>
		district.polygons.map((polygon) => ({ ...district, polygons: [polygon] })),
	);
	rows.push({ ...original, code: '9999', name: `${original.name} (copy)` });
	return shapefileZip(rows, 'districts', { project: toZone, system: null });
}

/** All corners of a border but its ends lie five metres off on one side: far enough not to be matched. */
function part({ ring, at, owner }: Site, copies: readonly District[]): void {
	const here = ring[at].join();
	const other = copies.find(
		({ code, polygons }) =>
			code !== owner.code && polygons.flat(2).some((corner) => corner.join() === here),
	);
	const theirs = new Set(other?.polygons.flat(2).map((corner) => corner.join()));
	const open = ring.slice(0, -1);
	const from = open.findIndex((corner) => !theirs.has(corner.join()));
	ring.splice(0, ring.length, ...open.slice(from), ...open.slice(0, from), open[from]);
	const along = ring.map((corner) => theirs.has(corner.join()));
	const off = ring.map((corner, i) =>
		along[i - 1] && along[i] && along[i + 1] ? beyond({ ring, at: i, owner }, -5 * metre) : corner,
	);
	ring.splice(0, ring.length, ...off);
}

/** A knot of four corners on a straight piece of coast, so that the outline crosses itself. */
function tieBow(copies: District[], clean: readonly District[]): void {
	const sides = new Set(clean.flatMap(({ polygons }) => polygons.flat().flatMap(sidesOf)));
	for (const { polygons } of copies) {
		const ring = polygons[0][0];
		const at = ring.findIndex((from, i) => {
			const to = ring[i + 1];
			return (
				to && Math.hypot(to[0] - from[0], to[1] - from[1]) > 0.02 && !sides.has(side(to, from))
			);
		});
		if (at < 0) continue;
		ring.splice(at + 1, 0, ...bow(ring[at], ring[at + 1]));
		return;
	}
	throw new Error('No straight piece of coast');
}

/** Four corners beside a side, on its right: out aslant, back over the first way, and in. */
function bow(from: Point, to: Point): Point[] {
	const [dx, dy] = [(to[0] - from[0]) / 4, (to[1] - from[1]) / 4];
	const middle: Point = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];
	const corner = (along: number, out: number): Point => [
		tidy(middle[0] + along * dx + out * dy * 1.6),
		tidy(middle[1] + along * dy - (out * dx) / 1.6),
	];
	return [corner(-1, 0), corner(1, 2), corner(-1, 2), corner(1, 0)];
}

const side = (a: Point, b: Point) => `${a.join()} ${b.join()}`;
const sidesOf = (ring: Point[]) => ring.slice(1).map((point, i) => side(ring[i], point));
