import { authalicSine } from '../geometry/areas.ts';

const radians = Math.PI / 180;

/** Radius of the sphere with the area of the WGS 84 ellipsoid (Snyder 1987, table 1 and equation 3-13). */
export const authalicKm = 6371.0071809;

/** Writes the unit vector of a place in degrees, by its latitude as it is. */
export function vectorAt(lon: number, lat: number, into: Float64Array, at: number): void {
	put(lon, Math.sin(lat * radians), Math.cos(lat * radians), into, at);
}

/** Writes the unit vector of a place in degrees on the sphere of equal area. */
export function authalicVectorAt(lon: number, lat: number, into: Float64Array, at: number): void {
	const sine = authalicSine(lat);
	put(lon, sine, Math.sqrt(Math.max(0, 1 - sine * sine)), into, at);
}

function put(lon: number, sine: number, cosine: number, into: Float64Array, at: number): void {
	into[at] = cosine * Math.cos(lon * radians);
	into[at + 1] = cosine * Math.sin(lon * radians);
	into[at + 2] = sine;
}

/** Longitude and latitude in degrees of the direction of a vector; null for a vector of no length. */
export function placeOf(x: number, y: number, z: number): { lon: number; lat: number } | null {
	const flat = Math.hypot(x, y);
	if (flat === 0 && z === 0) return null;
	return { lon: Math.atan2(y, x) / radians, lat: Math.atan2(z, flat) / radians };
}

/**
 * Flattens points (x, y, z on the unit sphere) around a centre by the Lambert azimuthal equal-area
 * projection (Snyder 1987, chapter 24): kilometres, interleaved, written to `into` from coordinate `at`.
 */
export function flatten(
	vectors: Float64Array,
	from: number,
	to: number,
	centre: { lon: number; lat: number },
	into: Float64Array,
	at: number,
): void {
	const [sinLon, cosLon] = [Math.sin(centre.lon * radians), Math.cos(centre.lon * radians)];
	const [sinLat, cosLat] = [Math.sin(centre.lat * radians), Math.cos(centre.lat * radians)];
	for (let p = from; p < to; p++) {
		const [x, y, z] = [vectors[3 * p], vectors[3 * p + 1], vectors[3 * p + 2]];
		const out = x * cosLon + y * sinLon;
		const towards = cosLat * out + sinLat * z;
		const scale = authalicKm * Math.sqrt(2 / Math.max(1 + towards, 1e-12));
		into[at + 2 * (p - from)] = scale * (y * cosLon - x * sinLon);
		into[at + 2 * (p - from) + 1] = scale * (cosLat * z - sinLat * out);
	}
}
