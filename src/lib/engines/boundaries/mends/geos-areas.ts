import { turned, type Part } from './parts.ts';

export type Geos = Awaited<ReturnType<typeof import('geos-wasm').default>>;

/** Runs `work` with a list of areas laid into the library's memory. */
export function withList<T>(geos: Geos, areas: number[], work: (list: number) => T): T {
	const list = geos.Module._malloc(4 * Math.max(1, areas.length));
	geos.Module.HEAPU32.set(areas, list / 4);
	const answer = work(list);
	geos.Module._free(list);
	return answer;
}

/** A part as a polygon of the library, to be destroyed by whoever asked for it. */
export function toGeos(geos: Geos, [outer, ...holes]: Part): number {
	const inner = holes.map((hole) => ringOf(geos, hole));
	return withList(geos, inner, (list) =>
		geos.GEOSGeom_createPolygon(ringOf(geos, outer), list, inner.length),
	);
}

function ringOf(geos: Geos, ring: Float64Array): number {
	const { Module } = geos;
	const count = ring.length / 2 + 1;
	const buffer = Module._malloc(16 * count);
	Module.HEAPF64.set(ring, buffer / 8);
	Module.HEAPF64.set(ring.subarray(0, 2), buffer / 8 + ring.length);
	const sequence = geos.GEOSCoordSeq_copyFromBuffer(buffer, count, 0, 0);
	Module._free(buffer);
	return geos.GEOSGeom_createLinearRing(sequence);
}

/** All polygons in an area of the library, whatever collections they lie in; lines and points are left. */
export function fromGeos(geos: Geos, area: number): Part[] {
	const type = geos.GEOSGeomTypeId(area);
	if (type === polygonType) return geos.GEOSisEmpty(area) ? [] : [partOf(geos, area)];
	if (type < firstCollection) return [];
	return Array.from({ length: geos.GEOSGetNumGeometries(area) }, (_, i) =>
		fromGeos(geos, geos.GEOSGetGeometryN(area, i)),
	).flat();
}

const polygonType = 3;
const firstCollection = 4;

function partOf(geos: Geos, polygon: number): Part {
	const rings = [pointsOf(geos, geos.GEOSGetExteriorRing(polygon))];
	for (let i = 0; i < geos.GEOSGetNumInteriorRings(polygon); i++) {
		rings.push(pointsOf(geos, geos.GEOSGetInteriorRingN(polygon, i)));
	}
	return turned(rings);
}

/** Points of a ring, without the first that is repeated at its end. */
function pointsOf(geos: Geos, ring: number): Float64Array {
	const { Module } = geos;
	const count = geos.GEOSGeomGetNumPoints(ring);
	const buffer = Module._malloc(16 * count);
	geos.GEOSCoordSeq_copyToBuffer(geos.GEOSGeom_getCoordSeq(ring), buffer, 0, 0);
	const points = Module.HEAPF64.slice(buffer / 8, buffer / 8 + 2 * count - 2);
	Module._free(buffer);
	return points;
}
