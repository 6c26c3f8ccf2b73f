import { boxOf } from '../../geometry/coverage-rings.ts';
import { doubleArea, sideOfRing } from '../../geometry/rings.ts';
import type { RawLayer } from '../raw-layer.ts';
import { Refusal } from '../refusal.ts';

const headerBytes = 100;
/** polygon, polygon with heights, polygon with measures */
const polygonTypes = new Set([5, 15, 25]);

export function isPolygonShp(head: Uint8Array): boolean {
	return head.length >= 36 && polygonTypes.has(viewOf(head).getInt32(32, true));
}

/**
 * The records of a .shp file (ESRI Shapefile Technical Description, 1998) into the layer, one region a
 * record. Every length is checked against the file before it is used.
 */
export function readShp(bytes: Uint8Array, layer: RawLayer): void {
	const view = viewOf(bytes);
	checkHeader(view, bytes.length);
	const end = view.getInt32(24) * 2;
	let at = headerBytes;
	let record = 0;
	while (at < end) {
		record++;
		if (at + 12 > end) throw truncated(record, at);
		const content = view.getInt32(at + 4) * 2;
		if (content < 4 || at + 8 + content > end) throw truncated(record, at);
		layer.startRegion();
		readRecord(new DataView(view.buffer, view.byteOffset + at + 8, content), record, layer);
		at += 8 + content;
	}
}

function checkHeader(view: DataView, length: number): void {
	if (length < headerBytes || view.getInt32(0) !== 9994) {
		throw new Refusal('zip-damaged', 'The .shp file does not begin as a shapefile does.');
	}
	const declared = view.getInt32(24) * 2;
	if (declared > length || declared < headerBytes) {
		const message = `The .shp file declares ${declared} bytes but has ${length}; it is cut off.`;
		throw new Refusal('file-truncated', message);
	}
	if (!polygonTypes.has(view.getInt32(32, true))) {
		throw new Refusal('no-areas', 'The shapefile holds points or lines, not areas.');
	}
}

function readRecord(view: DataView, record: number, layer: RawLayer): void {
	const type = view.getInt32(0, true);
	if (type === 0) return;
	if (!polygonTypes.has(type)) {
		throw new Refusal('bad-coordinate', `Record ${record} of the .shp file is not a polygon.`);
	}
	if (view.byteLength < 44) throw truncated(record, view.byteOffset);
	const parts = view.getInt32(36, true);
	const points = view.getInt32(40, true);
	if (parts < 0 || points < 0 || 44 + 4 * parts + 16 * points > view.byteLength) {
		throw new Refusal('bad-coordinate', `Record ${record} declares more points than it holds.`);
	}
	const rings: Float64Array[] = [];
	for (let p = 0; p < parts; p++) {
		const from = view.getInt32(44 + 4 * p, true);
		const to = p + 1 < parts ? view.getInt32(48 + 4 * p, true) : points;
		if (from < 0 || to < from || to > points) {
			throw new Refusal('bad-coordinate', `Record ${record} has a ring that lies outside it.`);
		}
		rings.push(ringOf(view, 44 + 4 * parts, from, to, record));
	}
	addRings(rings, layer);
}

function ringOf(view: DataView, base: number, from: number, to: number, record: number) {
	const ring = new Float64Array(2 * (to - from));
	for (let i = 0; i < ring.length; i++) {
		ring[i] = view.getFloat64(base + 16 * from + 8 * i, true);
		if (!Number.isFinite(ring[i])) {
			const message = `Record ${record} of the .shp file has a coordinate that is not a number.`;
			throw new Refusal('bad-coordinate', message);
		}
	}
	return ring;
}

/** Outer rings are clockwise. One that is not is a hole only if it lies in an outer ring of its record. */
function addRings(rings: Float64Array[], layer: RawLayer): void {
	const outers: Float64Array[] = [];
	const holes: Float64Array[] = [];
	for (const ring of rings) (doubleArea(ring, 0, ring.length / 2) <= 0 ? outers : holes).push(ring);
	const real = holesInside(holes, outers);
	for (const ring of holes) if (!real.has(ring)) outers.push(ring);
	for (const ring of outers) {
		layer.startPart();
		addRing(ring, layer);
	}
	for (const ring of holes) if (real.has(ring)) addRing(ring, layer);
}

const mostToCompare = 4_000_000;

/** With very many rings in one record the direction alone decides, so that time stays in bounds. */
function holesInside(holes: Float64Array[], outers: Float64Array[]): Set<Float64Array> {
	if (outers.length === 0) return new Set();
	if (holes.length * outers.length > mostToCompare) return new Set(holes);
	const boxes = outers.map(boxOf);
	const inside = (hole: Float64Array) => {
		const box = boxOf(hole);
		return outers.some((outer, i) => {
			const around = boxes[i];
			const fits =
				around[0] <= box[0] && around[1] <= box[1] && around[2] >= box[2] && around[3] >= box[3];
			return fits && liesIn(hole, outer);
		});
	};
	return new Set(holes.filter(inside));
}

function liesIn(hole: Float64Array, outer: Float64Array): boolean {
	for (let i = 0; i < hole.length; i += 2) {
		const side = sideOfRing(outer, 0, outer.length / 2, hole[i], hole[i + 1]);
		if (side !== 0) return side > 0;
	}
	return true;
}

function addRing(ring: Float64Array, layer: RawLayer): void {
	layer.startRing();
	for (let i = 0; i < ring.length; i += 2) layer.point(ring[i], ring[i + 1]);
}

function truncated(record: number, at: number): Refusal {
	const message = `The .shp file breaks off in record ${record}, at byte ${at}.`;
	return new Refusal('file-truncated', message);
}

const viewOf = (bytes: Uint8Array) =>
	new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
