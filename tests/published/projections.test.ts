/**
 * Worked examples of Snyder 1987, Map Projections: A Working Manual (USGS Professional Paper 1395,
 * Appendix A), for the sphere, against the projections as the sheet uses them. Values in
 * `values/snyder-sphere.json`, published to seven decimals.
 */
import proj4 from 'proj4';
import { describe, expect, it } from 'vitest';
import {
	equidistantAzimuthal,
	equidistantConic,
	lambertConformal,
	mercator,
	transverseMercator,
} from '../../src/lib/engines/sheet/plane/other-projections.ts';
import {
	albers,
	cylindrical,
	equalEarth,
	lambertAzimuthal,
	type ChosenProjection,
} from '../../src/lib/engines/sheet/plane/projections.ts';
import published from './values/snyder-sphere.json';

type Case = (typeof published.cases)[number];

const named = (beginning: string): Case =>
	published.cases.find(({ name }) => name.startsWith(beginning))!;

/** Snyder's y runs up and starts at the origin he gives; the sheet's runs down. */
function place({ R, lonlat }: Case, chosen: ChosenProjection, origin: [number, number]) {
	const [x, y] = chosen.projection(lonlat as [number, number])!;
	const [x0, y0] = chosen.projection(origin)!;
	return [R * (x - x0), R * (y0 - y)];
}

describe('projections against the worked examples of USGS PP 1395', () => {
	it('Albers equal-area conic, pp. 291-292', () => {
		const one = named('Albers');
		const chosen = albers(one.phi1!, one.phi2!, one.lam0);
		const [x, y] = place(one, chosen, [one.lam0, one.phi0!]);
		expect(x).toBeCloseTo(one.xy[0], 6);
		expect(y).toBeCloseTo(one.xy[1], 6);
	});

	it('Lambert azimuthal equal-area, oblique, pp. 332-333', () => {
		const one = named('Lambert azimuthal');
		const chosen = lambertAzimuthal(one.phi1!, one.lam0);
		const [x, y] = place(one, chosen, [one.lam0, one.phi1!]);
		expect(x).toBeCloseTo(one.xy[0], 6);
		expect(y).toBeCloseTo(one.xy[1], 6);
	});

	it('cylindrical equal-area, normal aspect, pp. 278-279', () => {
		const one = named('Cylindrical');
		const chosen = cylindrical(one.phiS!, one.lam0);
		const [x, y] = place(one, chosen, [one.lam0, 0]);
		expect(x).toBeCloseTo(one.xy[0], 6);
		expect(y).toBeCloseTo(one.xy[1], 6);
	});

	it('Lambert conformal conic, p. 295', () => {
		const one = named('Lambert conformal');
		const chosen = lambertConformal(one.phi1!, one.phi2!, one.lam0);
		const [x, y] = place(one, chosen, [one.lam0, one.phi0!]);
		expect(x).toBeCloseTo(one.xy[0], 6);
		expect(y).toBeCloseTo(one.xy[1], 6);
	});

	it('Mercator, p. 266', () => {
		const one = named('Mercator');
		const [x, y] = place(one, mercator(one.lam0), [one.lam0, 0]);
		expect(x).toBeCloseTo(one.xy[0], 6);
		expect(y).toBeCloseTo(one.xy[1], 6);
	});

	it('azimuthal equidistant, oblique, p. 337', () => {
		const one = named('Azimuthal equidistant');
		const chosen = equidistantAzimuthal(one.phi1!, one.lam0);
		const [x, y] = place(one, chosen, [one.lam0, one.phi1!]);
		expect(x).toBeCloseTo(one.xy[0], 6);
		expect(y).toBeCloseTo(one.xy[1], 6);
	});
});

/** proj4 2.22 (npm), which shares no code with d3-geo, on a sphere of radius 1. */
describe('projections against proj4', () => {
	const places: [number, number][] = [
		[12, 47],
		[-3, 60],
		[25, -12],
		[9, 0],
		[31, 71],
	];
	it.each<[string, string, ChosenProjection, [number, number]]>([
		['transverse Mercator', '+proj=tmerc +approx +lat_0=0 +lon_0=9', transverseMercator(9), [9, 0]],
		['Equal Earth', '+proj=eqearth +lon_0=9', equalEarth(9), [9, 0]],
		[
			'Lambert conformal conic',
			'+proj=lcc +lat_1=35 +lat_2=60 +lat_0=40 +lon_0=9',
			lambertConformal(35, 60, 9),
			[9, 40],
		],
	])('%s', (_, definition, chosen, origin) => {
		const reference = proj4(`${definition} +R=1 +no_defs`);
		for (const lonlat of places) {
			const [x, y] = reference.forward(lonlat);
			const [own, start] = [chosen.projection(lonlat)!, chosen.projection(origin)!];
			expect(own[0] - start[0]).toBeCloseTo(x, 6);
			expect(start[1] - own[1]).toBeCloseTo(y, 6);
		}
	});
});

/** proj4 gives no numbers for it on a sphere, so the formulas themselves: Snyder 1987, pp. 111-113, 16-1 to 16-4. */
describe('equidistant conic against the formulas of USGS PP 1395', () => {
	it.each([
		[12, 47],
		[-3, 60],
		[25, -12],
	])('%d° E %d° N', (lon, lat) => {
		const radians = Math.PI / 180;
		const [one, two, middle] = [35 * radians, 60 * radians, 40 * radians];
		const n = (Math.cos(one) - Math.cos(two)) / (two - one);
		const g = Math.cos(one) / n + one;
		const theta = n * (lon - 9) * radians;
		const rho = g - lat * radians;
		const { projection } = equidistantConic(35, 60, 9);
		const [own, start] = [projection([lon, lat])!, projection([9, 40])!];
		expect(own[0] - start[0]).toBeCloseTo(rho * Math.sin(theta), 9);
		expect(start[1] - own[1]).toBeCloseTo(g - middle - rho * Math.cos(theta), 9);
	});
});
