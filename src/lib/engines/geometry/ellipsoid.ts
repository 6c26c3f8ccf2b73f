import geodesic from 'geographiclib-geodesic';

/** WGS 84: semi-major axis in metres and first eccentricity squared (NGA.STND.0036, table 3.1). */
export const equatorMetres = 6378137;
export const flattening = 1 / 298.257223563;
export const eccentricity2 = flattening * (2 - flattening);

const radians = Math.PI / 180;
const localLimitMetres = 10_000;

/**
 * Geodesic length in metres on the WGS 84 ellipsoid between two places in degrees.
 * Below 10 km, less beyond 60 degrees of latitude: the two radii of curvature at the middle latitude
 * (relative error under 1e-6: accuracy.test.ts). Above: Karney, "Algorithms for geodesics",
 * Journal of Geodesy 87 (2013), by the author's library.
 */
export function geodesicMetres(lon1: number, lat1: number, lon2: number, lat2: number): number {
	const turn = Math.abs(lon2 - lon1);
	if (turn < 0.5 && Math.abs(lat1) < 80) {
		const local = localMetres(turn, lat1, lat2);
		if (local >= 0) return local;
	}
	return karneyMetres(lon1, lat1, lon2, lat2);
}

/** Karney's inverse problem, for any two places. */
export function karneyMetres(lon1: number, lat1: number, lon2: number, lat2: number): number {
	return geodesic.Geodesic.WGS84.Inverse(lat1, lon1, lat2, lon2, 1025).s12 ?? 0;
}

/** -1 where the formula would be off by a millionth: its error grows with (length x tangent of latitude)². */
function localMetres(turn: number, lat1: number, lat2: number): number {
	const middle = ((lat1 + lat2) / 2) * radians;
	const sine = Math.sin(middle);
	const w2 = 1 - eccentricity2 * sine * sine;
	const primeVertical = equatorMetres / Math.sqrt(w2);
	const meridian = (primeVertical * (1 - eccentricity2)) / w2;
	const cosine = Math.cos(middle);
	const east = primeVertical * cosine * turn * radians;
	const north = meridian * (lat2 - lat1) * radians;
	const metres = Math.sqrt(east * east + north * north);
	const isShort = metres <= localLimitMetres;
	return isShort && metres * Math.abs(sine) <= 1.7 * cosine * localLimitMetres ? metres : -1;
}

/**
 * Metres of one degree of longitude and of latitude at a latitude, for small local planes. Within 57 m of a
 * pole a degree of longitude counts as a metre, so that places at the pole stay apart on the flat map.
 */
export function metresPerDegree(lat: number): { east: number; north: number } {
	const sine = Math.sin(lat * radians);
	const w2 = 1 - eccentricity2 * sine * sine;
	const primeVertical = equatorMetres / Math.sqrt(w2);
	return {
		east: Math.max(primeVertical * Math.cos(lat * radians) * radians, 1),
		north: ((primeVertical * (1 - eccentricity2)) / w2) * radians,
	};
}

/** Geodesic length of the line through points `from` to `to` (inclusive) of interleaved degrees. */
export function lineMetres(points: Float64Array, from: number, to: number): number {
	let metres = 0;
	for (let i = from; i < to; i++) {
		const p = 2 * i;
		metres += geodesicMetres(points[p], points[p + 1], points[p + 2], points[p + 3]);
	}
	return metres;
}
