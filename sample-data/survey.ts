import proj4 from 'proj4';
import { signedArea, type Point } from './cells.ts';
import { density } from './districts.ts';
import { cityName, districtNames, provinceName } from './names.ts';
import type { Part } from './outline.ts';
import { hashed } from './random.ts';
import type { Republic } from './republic.ts';

/** The survey's grid: Lambert azimuthal equal-area on WGS 84, in the open North Atlantic. */
const grid =
	'+proj=laea +lat_0=53.4 +lon_0=-36 +x_0=500000 +y_0=500000 +datum=WGS84 +units=m +no_defs';

const onGrid = proj4('WGS84', grid);

/** The same in the words of a .prj file (OGC 01-009, well-known text 1). */
export const gridText =
	'PROJCS["Tavaroe_Survey_Grid",GEOGCS["GCS_WGS_1984",DATUM["D_WGS_1984",SPHEROID["WGS_1984",6378137.0,298.257223563]],PRIMEM["Greenwich",0.0],UNIT["Degree",0.0174532925199433]],PROJECTION["Lambert_Azimuthal_Equal_Area"],PARAMETER["False_Easting",500000.0],PARAMETER["False_Northing",500000.0],PARAMETER["Central_Meridian",-36.0],PARAMETER["Latitude_Of_Origin",53.4],UNIT["Meter",1.0]]';

export interface District {
	code: string;
	name: string;
	province: string;
	population: number;
	households: number;
	/** parts, rings, positions in degrees to five decimals; rings closed, outer ones anticlockwise */
	polygons: Point[][][];
}

/** Kilometres on the plane to degrees, kept to five decimals (about a metre). */
export function toDegrees([x, y]: Point): Point {
	const [lon, lat] = onGrid.inverse([500_000 + x * 1000, 500_000 + y * 1000]);
	return [Math.round(lon * 1e5) / 1e5, Math.round(lat * 1e5) / 1e5];
}

/** Degrees to metres on the survey's grid, kept to a hundredth of a millimetre. */
export function toGrid(position: Point): Point {
	const [x, y] = onGrid.forward(position);
	return [Math.round(x * 1e5) / 1e5, Math.round(y * 1e5) / 1e5];
}

/** Names, numbers and positions for every district, ordered by code. */
export function survey(republic: Republic, seed: number): District[] {
	const polygons = republic.districts.map(({ parts }) => parts.map(closedPart));
	const names = districtNames(coastal(polygons), seed);
	names[republic.city] = cityName;
	const codes = numbered(republic);
	return republic.districts
		.map(({ parts, province }, district) => ({
			code: codes[district],
			name: names[district],
			province: provinceName(province),
			...people(parts, district, district === republic.city, seed),
			polygons: polygons[district],
		}))
		.sort((a, b) => (a.code < b.code ? -1 : 1));
}

function closedPart(part: Part): Point[][] {
	return part.map((ring) => {
		const positions = ring.map(toDegrees);
		const kept = positions.filter((p, i) => p.join() !== positions[(i + 1) % ring.length].join());
		return [...kept, kept[0]];
	});
}

/** A district is by the sea where a side of it has no neighbour. */
function coastal(polygons: Point[][][][]): boolean[] {
	const key = (a: Point, b: Point) => `${a.join()} ${b.join()}`;
	const sides = (parts: Point[][][]) =>
		parts.flat().flatMap((ring) => ring.slice(1).map((point, i) => [ring[i], point] as const));
	const all = new Set(polygons.flatMap((parts) => sides(parts).map(([a, b]) => key(a, b))));
	return polygons.map((parts) => sides(parts).some(([a, b]) => !all.has(key(b, a))));
}

/** Province from 01, then district within it from 01, from north to south. */
function numbered({ districts }: Republic): string[] {
	const codes: string[] = [];
	const order = districts.map((_, district) => district);
	order.sort((a, b) => top(districts[b].parts) - top(districts[a].parts) || a - b);
	const used = new Map<number, number>();
	for (const district of order) {
		const { province } = districts[district];
		const number = (used.get(province) ?? 0) + 1;
		used.set(province, number);
		codes[district] = [province + 1, number].map((n) => String(n).padStart(2, '0')).join('');
	}
	return codes;
}

function top(parts: Part[]): number {
	return Math.max(...parts[0][0].map(([, y]) => y));
}

function people(
	parts: Part[],
	district: number,
	city: boolean,
	seed: number,
): { population: number; households: number } {
	const area = parts.flat().reduce((sum, ring) => sum + signedArea(ring), 0);
	const [x, y] = parts[0][0][0];
	const crowd = city ? 4200 : 24 * density([x, y]) ** 2.2 * (0.5 + hashed(district, 1, seed));
	const population = Math.round(area * crowd);
	return {
		population,
		households: Math.round(population / (2.1 + 0.5 * hashed(district, 2, seed))),
	};
}
