import type { FigureContext } from './figure-context.ts';
import type { Shape, Travel } from './figures-of.ts';
import { geodesicMetres } from '../geometry/ellipsoid.ts';
import { smallestCircle } from './smallest-circle.ts';
import { flatten, placeOf } from './sphere.ts';
import type { UnitGeometry } from './unit-geometry.ts';

/** 4 pi A / P²: 1 for a circle, less for all else. Polsby and Popper (1991), from memory. */
export const polsbyPopper = (areaKm2: number, perimeterKm: number) =>
	(4 * Math.PI * areaKm2) / perimeterKm ** 2;

/** Area over that of the smallest circle around it: 1 for a circle. Reock (1961), from memory. */
export const reock = (areaKm2: number, radiusKm: number) => areaKm2 / (Math.PI * radiusKm ** 2);

/**
 * Expected length of the shortest round through n places spread evenly over an area, for large n:
 * 0.7124 sqrt(n A). Beardwood, Halton and Hammersley (1959); the constant after Johnson, McGeoch and
 * Rothberg (1996), from memory. For few places it is too short: a guide, not a route.
 */
export const roundKm = (places: number, areaKm2: number) => 0.7124 * Math.sqrt(places * areaKm2);

/** The middle of an area: of its units' middles, weighed by their areas; null where they cancel out. */
export function middleOf({ middles, geometry }: FigureContext, units: readonly number[]) {
	if (!middles || !geometry) return null;
	const sum = [0, 0, 0];
	for (const u of units) {
		const weight = geometry.areaKm2[u];
		for (let axis = 0; axis < 3; axis++) sum[axis] += weight * middles[3 * u + axis];
	}
	return placeOf(sum[0], sum[1], sum[2]);
}

type Place = { lon: number; lat: number };

/** Twice the way from the base to the middle, and one round through the units. */
export function travelOf(
	{ at }: UnitGeometry,
	units: readonly number[],
	base: number,
	areaKm2: number,
	middle: Place | null,
): Travel {
	const round = roundKm(units.length, areaKm2);
	if (base < 0 || !middle) return { approachKm: null, roundKm: round, totalKm: round };
	const metres = geodesicMetres(at[2 * base], at[2 * base + 1], middle.lon, middle.lat);
	const approachKm = (2 * metres) / 1000;
	return { approachKm, roundKm: round, totalKm: approachKm + round };
}

/** Both measures of shape of the union of units of one territory. */
export function shapeOf(
	geometry: UnitGeometry,
	units: readonly number[],
	assignment: Int32Array,
	areaKm2: number,
	middle: Place | null,
): Shape {
	const perimeterKm = perimeterOf(geometry, units, assignment);
	const radius = middle && radiusKm(geometry, units, middle);
	return {
		perimeterKm,
		polsbyPopper: perimeterKm ? polsbyPopper(areaKm2, perimeterKm) : null,
		reock: radius ? reock(areaKm2, radius) : null,
	};
}

/** All outlines less twice what lies inside; every inner line is met from both of its sides. */
function perimeterOf(
	{ outlineMetres, lines, lineMetres }: UnitGeometry,
	units: readonly number[],
	assignment: Int32Array,
): number | null {
	if (!outlineMetres) return null;
	let metres = 0;
	for (const u of units) {
		metres += outlineMetres[u];
		for (let i = lines.offsets[u]; i < lines.offsets[u + 1]; i++) {
			if (assignment[lines.targets[i]] === assignment[u]) metres -= lineMetres[i];
		}
	}
	return Math.max(0, metres) / 1000;
}

/** Room for one territory's corners, written before it is read at every call. */
let flat = new Float64Array(1024);

/** Radius of the smallest circle around the hulls of units, on an equal-area plane around their middle. */
function radiusKm(
	{ hullStarts, hullVectors }: UnitGeometry,
	units: readonly number[],
	middle: Place,
): number | null {
	if (!hullStarts || !hullVectors) return null;
	let count = 0;
	for (const u of units) count += hullStarts[u + 1] - hullStarts[u];
	if (flat.length < 2 * count) flat = new Float64Array(4 * count);
	let at = 0;
	for (const u of units) {
		flatten(hullVectors, hullStarts[u], hullStarts[u + 1], middle, flat, at);
		at += 2 * (hullStarts[u + 1] - hullStarts[u]);
	}
	return smallestCircle(flat, count)?.radius ?? null;
}
