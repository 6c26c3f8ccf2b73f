import { crsOf } from '../crs.ts';
import { epsgDefinition, systemName } from '../epsg.ts';
import { knownSystems } from '../epsg-systems.ts';

type Box = [number, number, number, number];

/** A system in which a box of numbers lies where that system is used. */
export interface LikelySystem {
	code: number;
	name: string;
	/** the two numbers of each position stand northing first */
	swapped: boolean;
	/** degrees: west, south, east, north */
	box: Box;
	place(xy: [number, number]): [number, number];
}

const mostSystems = 8;
/** An area of use may be passed by so many degrees: files reach a little out to sea. */
const slack = 0.5;
/** UTM zones of Europe and the United States; every zone fits nearly any numbers, so only these are offered */
const usualZones = [25832, 25833, 25831, 25830, 26917, 26918, 26915, 26911];

/**
 * Systems that would lay a box of metres into their own area of use: those whose code stands in one of
 * the `hints` (the file's or layer's name) first, then grids by how small their area is, then usual UTM
 * zones, then systems of continents and the world; northing first only where no local one fits. At most eight. Without exactness: nine positions of the box are looked at.
 */
export function likelySystems(box: Box, hints: string[]): LikelySystem[] {
	const hinted = hints.flatMap((hint) => hint.match(/\d{4,5}/g) ?? []).map(Number);
	const grids = [...knownSystems].sort((p, q) => width(p[2]) - width(q[2])).map(([code]) => code);
	const codes = [...new Set([...hinted, ...grids, ...usualZones])];
	const known = codes.filter((code) => epsgDefinition(code) !== null);
	const asWritten = known.flatMap((code) => likely(code, box, false) ?? []);
	// nearly any numbers have a place on a continent or the whole world
	const isLocal = ({ code }: LikelySystem) => width(areaOf(code)) < broad;
	const locals = asWritten.filter(isLocal);
	const turned = locals.length ? [] : known.flatMap((code) => likely(code, box, true) ?? []);
	const world = asWritten.filter((system) => !isLocal(system));
	return [...locals, ...turned.filter(isLocal), ...world].slice(0, mostSystems);
}

/** square degrees: more than a country has, less than a continent */
const broad = 2500;
const width = ([west, south, east, north]: readonly number[]) => (east - west) * (north - south);

function likely(code: number, box: Box, swapped: boolean): LikelySystem | null {
	const { toLonLat, geographic } = crsOf(`EPSG:${code}`);
	if (!toLonLat || geographic) return null;
	const place = ([x, y]: [number, number]) => toLonLat(swapped ? [y, x] : [x, y]);
	const degrees = placedBox(box, place);
	if (!degrees || !isWithin(degrees, areaOf(code))) return null;
	return { code, name: systemName(code), swapped, box: degrees, place };
}

function placedBox(
	[west, south, east, north]: Box,
	place: (xy: [number, number]) => [number, number],
): Box | null {
	const placed: Box = [Infinity, Infinity, -Infinity, -Infinity];
	for (const x of [west, (west + east) / 2, east]) {
		for (const y of [south, (south + north) / 2, north]) {
			const [lon, lat] = place([x, y]);
			if (!Number.isFinite(lon) || !Number.isFinite(lat)) return null;
			placed[0] = Math.min(placed[0], lon);
			placed[1] = Math.min(placed[1], lat);
			placed[2] = Math.max(placed[2], lon);
			placed[3] = Math.max(placed[3], lat);
		}
	}
	return placed;
}

function isWithin(box: Box, area: readonly [number, number, number, number]): boolean {
	return (
		box[0] >= area[0] - slack &&
		box[1] >= area[1] - slack &&
		box[2] <= area[2] + slack &&
		box[3] <= area[3] + slack
	);
}

/** The register's area of use; of a UTM zone the zone, some degrees wider, as it is often used. */
function areaOf(code: number): readonly [number, number, number, number] {
	const listed = knownSystems.find(([known]) => known === code);
	if (listed) return listed[2];
	const definition = epsgDefinition(code) ?? '';
	const zone = Number(/zone=(\d+)/.exec(definition)?.[1] ?? code % 100);
	const isSouth = definition.includes('+south') || Math.floor(code / 100) === 327;
	const middle = 6 * zone - 183;
	return [middle - 5, isSouth ? -80 : 0, middle + 5, isSouth ? 0 : 84];
}
