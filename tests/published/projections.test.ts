/**
 * Worked examples of Snyder 1987, Map Projections: A Working Manual (USGS Professional Paper 1395,
 * Appendix A), for the sphere, against the projections as the sheet uses them. Values in
 * `values/snyder-sphere.json`, published to seven decimals.
 */
import { describe, expect, it } from 'vitest';
import {
	albers,
	cylindrical,
	lambertAzimuthal,
} from '../../src/lib/engines/sheet/plane/projections.ts';
import published from './values/snyder-sphere.json';

type Case = (typeof published.cases)[number];

const named = (beginning: string): Case =>
	published.cases.find(({ name }) => name.startsWith(beginning))!;

/** Snyder's y runs up and starts at the origin he gives; the sheet's runs down. */
function place({ R, lonlat }: Case, chosen: ReturnType<typeof albers>, origin: [number, number]) {
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
});
