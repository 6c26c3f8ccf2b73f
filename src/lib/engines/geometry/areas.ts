import { eccentricity2, equatorMetres } from './ellipsoid.ts';

const radians = Math.PI / 180;
const e = Math.sqrt(eccentricity2);
const fullQ = authalicQ(1);

/** q of Snyder (1987), "Map projections: a working manual", equation 3-12, from the sine of latitude. */
function authalicQ(sine: number): number {
	const es = e * sine;
	return (1 - eccentricity2) * (sine / (1 - es * es) + Math.atanh(es) / e);
}

/** Half the square of the authalic radius times the swept turn: see `sweptKm2`. */
const kilometres2 = ((equatorMetres / 1000) ** 2 * fullQ) / 2;

/** Sine of the authalic latitude (Snyder 3-11) of a latitude in degrees, -1 to 1. */
export function authalicSine(lat: number): number {
	return authalicQ(Math.sin(lat * radians)) / fullQ;
}

/**
 * Signed area in square kilometres between a line and the equator, walked from point `from` to `to`:
 * the sum over a closed anticlockwise ring is its area on the WGS 84 ellipsoid.
 * Edges are straight in the equal-area cylindrical plane. For regular polygons with geodesic edges of up
 * to 10 km, within 80 degrees of the equator, the error is below one part in a million (against Karney's
 * polygon area: accuracy.test.ts); it grows with the square of the edges.
 */
export function sweptKm2(points: Float64Array, from: number, to: number): number {
	let swept = 0;
	let before = authalicSine(points[2 * from + 1]);
	for (let i = from + 1; i <= to; i++) {
		const sine = authalicSine(points[2 * i + 1]);
		swept -= (points[2 * i] - points[2 * i - 2]) * radians * (before + sine);
		before = sine;
	}
	return (swept / 2) * kilometres2;
}
