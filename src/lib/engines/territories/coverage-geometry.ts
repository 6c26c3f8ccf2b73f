import type { Coverage } from '../geometry/coverage.ts';
import { ringPoints } from '../geometry/coverage-rings.ts';
import { geodesicMetres } from '../geometry/ellipsoid.ts';
import { hullOf } from './hull.ts';
import { authalicVectorAt, flatten, placeOf, vectorAt } from './sphere.ts';
import { linesFrom, type UnitGeometry } from './unit-geometry.ts';

/**
 * The geometry of the regions of a coverage, by region number.
 *
 * - The middle is the centre of area on the sphere: the sum over the outline of half the angle of each
 *   edge times its normal is the integral of the place over the region (Stokes), taken arc by arc.
 * - Outlines leave out edges along the 180th meridian and at the poles, where parts were only cut.
 * - Hulls are those of the outer rings of all parts. Linear time, apart from sorting them.
 */
export function unitGeometry(coverage: Coverage): UnitGeometry {
	const middles = middlesOf(coverage);
	return {
		at: middles,
		areaKm2: coverage.areasKm2,
		...outlinesOf(coverage),
		...hullsOf(coverage, middles),
	};
}

function middlesOf({ arcPoints, arcStarts, arcLeft, arcRight, areasKm2 }: Coverage): Float64Array {
	const sums = new Float64Array(3 * areasKm2.length);
	const [p, q] = [new Float64Array(3), new Float64Array(3)];
	for (let arc = 0; arc < arcLeft.length; arc++) {
		vectorAt(arcPoints[2 * arcStarts[arc]], arcPoints[2 * arcStarts[arc] + 1], p, 0);
		for (let i = arcStarts[arc] + 1; i < arcStarts[arc + 1]; i++) {
			vectorAt(arcPoints[2 * i], arcPoints[2 * i + 1], q, 0);
			const x = p[1] * q[2] - p[2] * q[1];
			const y = p[2] * q[0] - p[0] * q[2];
			const z = p[0] * q[1] - p[1] * q[0];
			const sine = Math.hypot(x, y, z);
			// angle over sine, which tends to 1 for short edges
			const scale =
				sine > 1e-9 ? Math.atan2(sine, p[0] * q[0] + p[1] * q[1] + p[2] * q[2]) / sine : 1;
			add(sums, arcLeft[arc], x * scale, y * scale, z * scale);
			add(sums, arcRight[arc], -x * scale, -y * scale, -z * scale);
			p.set(q);
		}
	}
	const at = new Float64Array(2 * areasKm2.length);
	for (let u = 0; u < areasKm2.length; u++) {
		const place = placeOf(sums[3 * u], sums[3 * u + 1], sums[3 * u + 2]);
		at[2 * u] = place?.lon ?? 0;
		at[2 * u + 1] = place?.lat ?? 0;
	}
	return at;
}

function add(sums: Float64Array, unit: number, x: number, y: number, z: number): void {
	if (unit < 0) return;
	sums[3 * unit] += x;
	sums[3 * unit + 1] += y;
	sums[3 * unit + 2] += z;
}

function outlinesOf(coverage: Coverage) {
	const { arcLeft, arcRight, areasKm2 } = coverage;
	const outlineMetres = new Float64Array(areasKm2.length);
	const borders = { a: [] as number[], b: [] as number[], metres: [] as number[] };
	for (let arc = 0; arc < arcLeft.length; arc++) {
		const [left, right] = [arcLeft[arc], arcRight[arc]];
		if (left === right) continue;
		const metres = coverage.arcMetres[arc] - seamMetres(coverage, arc);
		if (left >= 0) outlineMetres[left] += metres;
		if (right >= 0) outlineMetres[right] += metres;
		if (left < 0 || right < 0) continue;
		borders.a.push(left);
		borders.b.push(right);
		borders.metres.push(metres);
	}
	return { outlineMetres, ...linesFrom(areasKm2.length, borders) };
}

function seamMetres({ arcPoints, arcStarts }: Coverage, arc: number): number {
	let metres = 0;
	for (let i = arcStarts[arc] + 1; i < arcStarts[arc + 1]; i++) {
		const [lon, lat] = [arcPoints[2 * i], arcPoints[2 * i + 1]];
		const [before, beforeLat] = [arcPoints[2 * i - 2], arcPoints[2 * i - 1]];
		if (Math.abs(lon) === 180 && before === lon) {
			metres += geodesicMetres(before, beforeLat, lon, lat);
		}
	}
	return metres;
}

function hullsOf(coverage: Coverage, middles: Float64Array) {
	const { regionParts, partRings } = coverage;
	const hullStarts = new Uint32Array(regionParts.length);
	const corners: number[] = [];
	for (let u = 0; u + 1 < regionParts.length; u++) {
		const rings: Float64Array[] = [];
		for (let part = regionParts[u]; part < regionParts[u + 1]; part++) {
			rings.push(ringPoints(coverage, partRings[part]));
		}
		const count = rings.reduce((sum, ring) => sum + ring.length / 2, 0);
		const vectors = new Float64Array(3 * count);
		let at = 0;
		for (const ring of rings) {
			for (let i = 0; i < ring.length; i += 2, at += 3) {
				authalicVectorAt(ring[i], ring[i + 1], vectors, at);
			}
		}
		const flat = new Float64Array(2 * count);
		flatten(vectors, 0, count, { lon: middles[2 * u], lat: middles[2 * u + 1] }, flat, 0);
		for (const p of hullOf(flat, count)) {
			corners.push(vectors[3 * p], vectors[3 * p + 1], vectors[3 * p + 2]);
		}
		hullStarts[u + 1] = corners.length / 3;
	}
	return { hullStarts, hullVectors: Float64Array.from(corners) };
}
