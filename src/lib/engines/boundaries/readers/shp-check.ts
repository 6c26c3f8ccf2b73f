import { doubleArea } from '../../geometry/rings.ts';
import { Refusal } from '../refusal.ts';

const headerBytes = 100;
/** polygon, polygon with heights, polygon with measures */
const polygonTypes = new Set([5, 15, 25]);

/**
 * The most edges that may be looked at to find which outer ring each hole of a record lies in: about two
 * seconds. The package that reads the rings compares every hole with every outer ring.
 */
const mostHoleEdges = 200_000_000;

export function isPolygonShp(head: Uint8Array): boolean {
	return head.length >= 36 && polygonTypes.has(viewOf(head).getInt32(32, true));
}

/**
 * Checks every length and number of a .shp file (ESRI Shapefile Technical Description, 1998) against its
 * bytes, and answers how many records it holds. What passes can be read without running out of it; the
 * answer is refused with the record and the byte where it cannot.
 */
export function checkShp(bytes: Uint8Array): number {
	const view = viewOf(bytes);
	checkHeader(view, bytes.length);
	const type = view.getInt32(32, true);
	const end = view.getInt32(24) * 2;
	let at = headerBytes;
	let record = 0;
	while (at < end) {
		record++;
		if (at + 12 > end) throw truncated(record, at);
		const content = view.getInt32(at + 4) * 2;
		if (content < 4 || at + 8 + content > end) throw truncated(record, at);
		checkRecord(new DataView(view.buffer, view.byteOffset + at + 8, content), record, type);
		at += 8 + content;
	}
	return record;
}

/** The bytes that the header declares: what follows them is not part of the file. */
export const declaredShp = (bytes: Uint8Array) => bytes.subarray(0, viewOf(bytes).getInt32(24) * 2);

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

function checkRecord(view: DataView, record: number, fileType: number): void {
	const type = view.getInt32(0, true);
	if (type === 0) return;
	if (type !== fileType) {
		const message = `Record ${record} of the .shp file is of another kind than the file says.`;
		throw new Refusal('bad-coordinate', message);
	}
	if (view.byteLength < 44) throw truncated(record, view.byteOffset);
	const parts = view.getInt32(36, true);
	const points = view.getInt32(40, true);
	if (parts < 0 || points < 0 || 44 + 4 * parts + 16 * points > view.byteLength) {
		throw new Refusal('bad-coordinate', `Record ${record} declares more points than it holds.`);
	}
	const positions = positionsOf(view, 44 + 4 * parts, points, record);
	let holes = 0;
	let outerPoints = 0;
	for (let p = 0; p < parts; p++) {
		const from = view.getInt32(44 + 4 * p, true);
		const to = p + 1 < parts ? view.getInt32(48 + 4 * p, true) : points;
		if (from < 0 || to < from || to > points) {
			throw new Refusal('bad-coordinate', `Record ${record} has a ring that lies outside it.`);
		}
		if (to - from >= 4 && doubleArea(positions, from, to) <= 0) outerPoints += to - from;
		else holes++;
	}
	if (holes * outerPoints > mostHoleEdges) {
		const message = `Record ${record} of the .shp file has ${holes} holes among ${parts} rings with ${points} points, too many to tell which lies in which. Divide it into several records.`;
		throw new Refusal('too-large-unpacked', message);
	}
}

function positionsOf(view: DataView, base: number, points: number, record: number): Float64Array {
	const positions = new Float64Array(2 * points);
	for (let i = 0; i < positions.length; i++) {
		positions[i] = view.getFloat64(base + 8 * i, true);
		if (!Number.isFinite(positions[i])) {
			const message = `Record ${record} of the .shp file has a coordinate that is not a number.`;
			throw new Refusal('bad-coordinate', message);
		}
	}
	return positions;
}

function truncated(record: number, at: number): Refusal {
	const message = `The .shp file breaks off in record ${record}, at byte ${at}.`;
	return new Refusal('file-truncated', message);
}

const viewOf = (bytes: Uint8Array) =>
	new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
