import geodesic from 'geographiclib-geodesic';
import { describe, expect, it } from 'vitest';
import { sweptKm2 } from './areas.ts';
import { geodesicMetres } from './ellipsoid.ts';

// Both are measured against geographiclib-geodesic, the library of the author of "Algorithms for
// geodesics" (C. F. F. Karney, Journal of Geodesy 87, 2013).
const wgs84 = geodesic.Geodesic.WGS84;

const latitudes = [-79, -60, -35, -5, 0, 12, 30, 45, 60, 70, 79];
const bearings = [0, 17, 45, 73, 90, 118, 161, 200, 262, 315];

describe('lengths', () => {
	/** The greatest relative error over all latitudes and bearings at one length. */
	const worst = (metres: number) => {
		let most = 0;
		for (const lat of latitudes) {
			for (const bearing of bearings) {
				const { lat2 = NaN, lon2 = NaN } = wgs84.Direct(lat, 10, bearing, metres);
				most = Math.max(most, Math.abs(geodesicMetres(10, lat, lon2, lat2) / metres - 1));
			}
		}
		return most;
	};
	it.each([1, 100, 1000, 5000, 9999])('of %d m are right within a millionth', (metres) => {
		expect(worst(metres)).toBeLessThan(1e-6);
	});
	it.each([10_001, 50_000, 1_000_000, 19_000_000])('of %d m are the library’s own', (metres) => {
		expect(worst(metres)).toBeLessThan(1e-12 + 1e-8 / metres);
	});
});

describe('areas', () => {
	/** A polygon of equal edges round a place, and its relative error. */
	const error = (lat: number, edgeMetres: number) => {
		const corners = 36;
		const radius = edgeMetres / (2 * Math.sin(Math.PI / corners));
		const points = new Float64Array(2 * corners + 2);
		const exact = wgs84.Polygon(false);
		for (let i = 0; i < corners; i++) {
			const { lat2 = NaN, lon2 = NaN } = wgs84.Direct(lat, 10, -(360 * i) / corners, radius);
			points.set([lon2, lat2], 2 * i);
			exact.AddPoint(lat2, lon2);
		}
		points.copyWithin(2 * corners, 0, 2);
		const { area } = exact.Compute(false, true) as { area: number };
		return Math.abs((sweptKm2(points, 0, corners) * 1e6) / area - 1);
	};
	const worst = (edgeMetres: number) => Math.max(...latitudes.map((lat) => error(lat, edgeMetres)));
	it.each([[1000], [5000], [10_000]])('with edges of %d m: relative error', (edge) => {
		expect(worst(edge)).toBeLessThan(1e-6);
	});
});
